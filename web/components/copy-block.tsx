import { useState } from 'react';
import { announce } from '#web/lib/announce.ts';
import { Button } from './button.tsx';

/** Lines of text with a button that copies them; where the browser forbids that, they are selected instead. */
export function CopyBlock({ text, what }: { text: string; what: string }) {
  const [state, setState] = useState<'fresh' | 'copied' | 'selected'>('fresh');
  const copy = async (button: HTMLButtonElement) => {
    try {
      await navigator.clipboard.writeText(text);
      setState('copied');
      announce(`The ${what} ${what.endsWith('s') ? 'are' : 'is'} copied`);
    } catch {
      const block = button.parentElement?.querySelector('pre');
      if (block) getSelection()?.selectAllChildren(block);
      setState('selected');
      announce(`The ${what} ${what.endsWith('s') ? 'are' : 'is'} selected: copy by keyboard`);
    }
  };
  return (
    <div className="copy">
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must take the focus to scroll by keyboard. */}
      <pre tabIndex={0}>{text}</pre>
      <Button
        kind="quiet"
        aria-label={`Copy the ${what}`}
        onClick={(event) => void copy(event.currentTarget)}
      >
        {state === 'copied' ? 'Copied' : state === 'selected' ? 'Selected' : 'Copy'}
      </Button>
    </div>
  );
}
