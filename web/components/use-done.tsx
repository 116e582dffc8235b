import { type ReactNode, useEffect, useState } from 'react';
import { announce } from '#web/lib/announce.ts';

/** A line beside a button that says that it is done, to eye and ear, and leaves after a while. */
export function useDone(): [ReactNode, (text: string) => void] {
  const [text, setText] = useState<string | null>(null);
  useEffect(() => {
    if (text === null) return;
    const timer = setTimeout(() => setText(null), 8000);
    return () => clearTimeout(timer);
  }, [text]);
  const say = (done: string) => {
    setText(done);
    announce(done);
  };
  const line = text === null ? null : <span className="within">{text}</span>;
  return [line, say];
}
