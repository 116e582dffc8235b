const WORDS = { within: 'within', outside: 'outside', unlimited: 'no limits' } as const;
const TONES = {
  within: 'text-within',
  outside: 'text-outside font-semibold',
  unlimited: 'text-ink-soft',
} as const;

/** A verdict by shape, colour and word: a ring within, a cross outside, a dash where nothing is limited. */
export function VerdictMark({ verdict, word }: { verdict: keyof typeof WORDS; word?: string }) {
  return (
    <span className={`whitespace-nowrap ${TONES[verdict]}`}>
      <svg viewBox="0 0 12 12" className="mr-[7px] inline-block size-3 align-[-1px]" aria-hidden="true">
        <g fill="none" stroke="currentColor">
          {verdict === 'within' && <circle cx="6" cy="6" r="4.6" strokeWidth="1.8" />}
          {verdict === 'outside' && <path d="M1.5 1.5l9 9m0-9l-9 9" strokeWidth="2" />}
          {verdict === 'unlimited' && <path d="M2 6h8" strokeWidth="1.6" />}
        </g>
      </svg>
      {word ?? WORDS[verdict]}
    </span>
  );
}
