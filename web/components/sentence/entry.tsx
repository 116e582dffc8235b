import { useState } from 'react';

/**
 * A word of a sentence that is written instead of chosen; it takes the focus, Enter takes it, Escape leaves it.
 *
 * @param onDone what was written, or null where it was left as it was
 */
export function Entry({
  name,
  type,
  first,
  placeholder,
  onDone,
}: {
  name: string;
  type: 'text' | 'date';
  first: string;
  placeholder?: string;
  onDone: (value: string | null) => void;
}) {
  const [text, setText] = useState(first);
  return (
    <input
      // biome-ignore lint/a11y/noAutofocus: it stands where the button was that asked for it
      autoFocus
      type={type}
      aria-label={name}
      value={text}
      placeholder={placeholder}
      className="w-44 border-b-[1.5px] border-brass bg-transparent px-1 text-ink"
      onChange={(event) => setText(event.target.value)}
      onBlur={() => onDone(text === '' || text === first ? null : text)}
      onKeyDown={(event) => {
        if (event.key === 'Enter') onDone(text === '' ? null : text);
        if (event.key === 'Escape') onDone(null);
      }}
    />
  );
}
