import { describe, expect, it } from 'vitest';
import { placeAfter, placeTyped } from '#web/components/sentence/listbox-keys.ts';

describe('the keys of a list', () => {
  it('move and stop at its ends', () => {
    expect(placeAfter('ArrowDown', 1, 3)).toBe(2);
    expect(placeAfter('ArrowDown', 2, 3)).toBe(2);
    expect(placeAfter('ArrowUp', 0, 3)).toBe(0);
    expect(placeAfter('Home', 2, 3)).toBe(0);
    expect(placeAfter('End', 0, 3)).toBe(2);
    expect(placeAfter('x', 0, 3)).toBeNull();
  });
  it('find what begins with what was typed, and go round', () => {
    const labels = ['any state', 'flight', 'folded', 'stowed'];
    expect(placeTyped(labels, 'f', 0)).toBe(1);
    expect(placeTyped(labels, 'f', 1)).toBe(2);
    expect(placeTyped(labels, 'f', 2)).toBe(1);
    expect(placeTyped(labels, 'fo', 1)).toBe(2);
    expect(placeTyped(labels, 'q', 0)).toBeNull();
  });
});
