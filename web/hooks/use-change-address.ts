import { type NavigateOptions, useNavigate } from 'react-router-dom';
import { withKeys } from '#web/components/history/history-view.ts';

/**
 * Changes keys of the page's address, null takes one out. It goes from what the address says at that moment, which may
 * be ahead of what is drawn: of two quick choices neither is lost.
 */
export function useChangeAddress(options: Pick<NavigateOptions, 'replace'> = {}) {
  const navigate = useNavigate();
  return (changes: Readonly<Record<string, string | null>>): void => {
    const search = withKeys(new URLSearchParams(window.location.search), changes);
    void navigate(`?${search}`, { ...options, preventScrollReset: true });
  };
}
