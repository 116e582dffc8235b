type Listener = () => void;

let said = '';
const listeners = new Set<Listener>();

/** Says a short text in the page's live region, for those who do not see what changed. */
export function announce(text: string): void {
  // The same words twice are news twice: a no-break space makes them differ.
  said = text === said ? `${text}\u00a0` : text;
  for (const listener of listeners) listener();
}

export const announcements = {
  subscribe: (listener: Listener) => {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  },
  current: () => said,
};
