import { useSyncExternalStore } from 'react';
import { announcements } from '#web/lib/announce.ts';

/** The page's live region. */
export function Announcer() {
  const text = useSyncExternalStore(announcements.subscribe, announcements.current);
  return (
    <div role="status" className="sr-only">
      {text}
    </div>
  );
}
