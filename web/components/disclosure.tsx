import { type ReactNode, useEffect, useId, useRef, useState } from 'react';

/** A button that opens a short list under it. Escape and a click elsewhere close it; the focus goes back to the button. */
export function Disclosure({
  label,
  name,
  children,
}: {
  label: ReactNode;
  /** What a screen reader is told where the label alone would not do. */
  name?: string;
  children: (close: () => void) => ReactNode;
}) {
  const [open, setOpen] = useState(false);
  const root = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const id = useId();
  useEffect(() => {
    if (!open) return;
    const onOutside = (event: PointerEvent | FocusEvent) => {
      if (!root.current?.contains(event.target as Node)) setOpen(false);
    };
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== 'Escape') return;
      setOpen(false);
      button.current?.focus();
    };
    document.addEventListener('pointerdown', onOutside);
    document.addEventListener('focusin', onOutside);
    document.addEventListener('keydown', onKey);
    return () => {
      document.removeEventListener('pointerdown', onOutside);
      document.removeEventListener('focusin', onOutside);
      document.removeEventListener('keydown', onKey);
    };
  }, [open]);
  return (
    <div className="opener" ref={root}>
      <button
        type="button"
        ref={button}
        aria-expanded={open}
        aria-controls={id}
        aria-label={name}
        onClick={() => setOpen(!open)}
      >
        {label}
      </button>
      <div id={id} className="opened" hidden={!open}>
        {open && children(() => setOpen(false))}
      </div>
    </div>
  );
}
