import { type KeyboardEvent, useEffect, useRef, useState } from 'react';
import { placeAfter, placeTyped } from './listbox-keys.ts';

const TYPED_TOGETHER_MS = 700;

/**
 * A list that opens from a button: arrows, Home, End and letters move, Enter and Space choose, Escape and Tab close.
 *
 * @param labels in order; `chosen` is where the list opens
 */
export function useListbox(labels: readonly string[], chosen: number, choose: (index: number) => void) {
  const [open, setOpen] = useState(false);
  const [at, setAt] = useState(0);
  const button = useRef<HTMLButtonElement>(null);
  const list = useRef<HTMLSpanElement>(null);
  const typed = useRef({ text: '', time: 0 });

  const show = () => {
    setAt(Math.max(0, chosen));
    setOpen(true);
  };
  const close = (returning: boolean) => {
    setOpen(false);
    if (returning) button.current?.focus();
  };
  const take = (index: number) => {
    close(true);
    choose(index);
  };

  useEffect(() => {
    if (open) list.current?.focus({ preventScroll: true });
  }, [open]);
  useEffect(() => {
    if (open) list.current?.querySelector(`[data-index="${at}"]`)?.scrollIntoView({ block: 'nearest' });
  }, [open, at]);

  const onButtonKey = (event: KeyboardEvent) => {
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    event.preventDefault();
    show();
  };
  const onListKey = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const next = placeAfter(event.key, at, labels.length);
    if (next !== null) setAt(next);
    else if (event.key === 'Enter' || event.key === ' ') take(at);
    else if (event.key === 'Escape') close(true);
    else if (event.key === 'Tab') return close(true);
    else if (event.key.length === 1) jump(event.key);
    else return;
    event.preventDefault();
  };
  const jump = (letter: string) => {
    const now = Date.now();
    const together = now - typed.current.time < TYPED_TOGETHER_MS;
    typed.current = { text: (together ? typed.current.text : '') + letter, time: now };
    const found = placeTyped(labels, typed.current.text, at);
    if (found !== null) setAt(found);
  };

  return { open, at, button, list, show, close, take, setAt, onButtonKey, onListKey };
}
