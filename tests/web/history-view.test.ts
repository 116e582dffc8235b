import { describe, expect, it } from 'vitest';
import { isFiltered, readHistoryView, withKeys } from '#web/components/history/history-view.ts';
import { inOrder, runName } from '#web/components/history/run-name.ts';
import { sinceOptions } from '#web/components/history/since-options.ts';

const read = (query: string) => readHistoryView(new URLSearchParams(query));

describe('the address of the history', () => {
  it('says everything that is shown', () => {
    expect(
      read(
        'assembly=boom&state=flight&branch=main&verdict=outside&since=2026-08-01&sort=heaviest&cursor=c&quantity=centre.x',
      ),
    ).toEqual({
      filter: { assembly: 'boom', state: 'flight', branch: 'main', verdict: 'outside', since: '2026-08-01' },
      sort: 'heaviest',
      cursor: 'c',
      quantity: 'centre.x',
    });
  });
  it('counts what it says wrongly as not said', () => {
    const view = read('verdict=toString&since=2026-13-45&sort=__proto__&quantity=charm');
    expect(view.sort).toBe('newest');
    expect(view.quantity).toBe('mass');
    expect(isFiltered(view)).toBe(false);
  });
  it('loses its place in the list where the list becomes another, and only there', () => {
    const search = new URLSearchParams('cursor=c&state=flight');
    expect(withKeys(search, { state: null }).toString()).toBe('');
    expect(withKeys(search, { sort: 'oldest' }).get('cursor')).toBeNull();
    expect(withKeys(search, { quantity: 'centre.x' }).get('cursor')).toBe('c');
    expect(search.get('cursor')).toBe('c');
  });
});

it('offers days back and the first of the months before, each once', () => {
  const options = sinceOptions(new Date('2026-03-31T23:00:00Z'));
  expect(options.slice(0, 4).map((o) => o.value)).toEqual(['', '2026-03-24', '2026-03-01', '2025-12-31']);
  expect(options.map((o) => o.value)).toContain('2026-02-01');
  expect(new Set(options.map((o) => o.value)).size).toBe(options.length);
});

it('names a run by its commit, outside git by its stamp', () => {
  expect(runName({ commit: '4e1c09b77', stamp: 'ffff' })).toBe('4e1c09b');
  expect(runName({ commit: null, stamp: '9f2c81aa03' })).toBe('9f2c81a');
});

it('puts the earlier of two runs on side A', () => {
  const [early, late] = [{ at: '2026-10-02T15:27:00Z' }, { at: '2026-11-14T09:12:00+01:00' }];
  expect(inOrder(late, early)).toEqual([early, late]);
  expect(inOrder(early, late)).toEqual([early, late]);
});
