import type { ComponentProps } from 'react';
import { Link, type LinkProps } from 'react-router-dom';

type Kind = 'plain' | 'quiet' | 'grave' | 'word' | 'grave word';

const CLASS: Record<Kind, string> = {
  plain: 'act',
  quiet: 'act quiet',
  grave: 'act grave',
  word: 'word',
  'grave word': 'word grave',
};

/** A button: plain for the one thing a page is for, quiet beside it, grave for what cannot be undone, word in a line of text. */
export function Button({ kind = 'plain', ...rest }: ComponentProps<'button'> & { kind?: Kind }) {
  return <button type="button" {...rest} className={`${CLASS[kind]} ${rest.className ?? ''}`} />;
}

/** A link that looks like a button, for going on to the next step. */
export function ActionLink({ kind = 'plain', ...rest }: LinkProps & { kind?: Kind }) {
  return <Link {...rest} className={`${CLASS[kind]} ${rest.className ?? ''}`} />;
}

/** A file of the server, as a link that looks like a button. */
export function DownloadLink({ kind = 'quiet', ...rest }: ComponentProps<'a'> & { kind?: Kind }) {
  return (
    <a download {...rest} className={`${CLASS[kind]} ${rest.className ?? ''}`}>
      {rest.children}
    </a>
  );
}
