import { useId, useLayoutEffect, useState } from 'react';
import type { Option } from './option.ts';
import { useListbox } from './use-listbox.ts';

/**
 * A word of a sentence that can be chosen: underlined in brass, opens a list, works by keyboard.
 *
 * @param name what is chosen, for a screen reader: `assembly`
 */
export function Choice<T extends string>({
  name,
  options,
  value,
  onChoose,
}: {
  name: string;
  options: readonly Option<T>[];
  value: T;
  onChoose: (value: T) => void;
}) {
  const id = useId();
  const chosen = options.findIndex((option) => option.value === value);
  const box = useListbox(
    options.map((option) => option.label),
    chosen,
    (index) => onChoose(options[index]!.value),
  );
  return (
    <span className="relative inline-block">
      <button
        ref={box.button}
        type="button"
        aria-haspopup="listbox"
        aria-expanded={box.open}
        aria-label={`${name}: ${options[chosen]?.label ?? value}`}
        onClick={() => (box.open ? box.close(true) : box.show())}
        onKeyDown={box.onButtonKey}
      >
        {options[chosen]?.label ?? value}
      </button>
      {box.open && <OpenList id={id} name={name} options={options} chosen={chosen} box={box} />}
    </span>
  );
}

function OpenList<T extends string>({
  id,
  name,
  options,
  chosen,
  box,
}: {
  id: string;
  name: string;
  options: readonly Option<T>[];
  chosen: number;
  box: ReturnType<typeof useListbox>;
}) {
  const [shift, setShift] = useState(0);
  // Where the list would run off the page at its right, it moves to the left; again when the page turns or shrinks.
  useLayoutEffect(() => {
    const place = () => {
      const { right } = box.list.current!.getBoundingClientRect();
      setShift((now) => Math.min(0, document.documentElement.clientWidth - 8 - (right - now)));
    };
    place();
    window.addEventListener('resize', place);
    return () => window.removeEventListener('resize', place);
  }, [box.list]);
  return (
    <span
      ref={box.list}
      role="listbox"
      tabIndex={0}
      aria-label={name}
      aria-activedescendant={`${id}-${box.at}`}
      onKeyDown={box.onListKey}
      onBlur={() => box.close(false)}
      style={{ left: shift }}
      className="absolute top-full z-20 mt-1 max-h-80 w-max min-w-full max-w-[min(26rem,calc(100vw-16px))] overflow-y-auto border border-rule-strong bg-paper py-1.5 text-base outline-none"
    >
      {options.map((option, i) => (
        // biome-ignore lint/a11y/useKeyWithClickEvents: the listbox has the keys
        <span
          key={option.value}
          id={`${id}-${i}`}
          data-index={i}
          role="option"
          tabIndex={-1}
          aria-selected={i === chosen}
          onPointerDown={(event) => event.preventDefault()}
          onPointerMove={() => box.setAt(i)}
          onClick={() => box.take(i)}
          className={`flex cursor-pointer items-baseline gap-2 px-3 py-1 ${i === box.at ? 'bg-paper-deep' : ''} ${i === chosen ? 'font-semibold' : ''}`}
        >
          <span aria-hidden="true" className="w-3 shrink-0 text-brass">
            {i === chosen ? '▾' : ''}
          </span>
          <span className="min-w-0 break-words">
            {option.label}
            {option.hint && <span className="ml-2 text-sm font-normal text-ink-soft">{option.hint}</span>}
          </span>
        </span>
      ))}
    </span>
  );
}
