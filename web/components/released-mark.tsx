/** The brass fulcrum of a released run; open where its release was withdrawn. */
export function ReleasedMark({ withdrawn = false }: { withdrawn?: boolean }) {
  return (
    <svg
      viewBox="0 0 12 10"
      className="mr-1.5 inline-block h-2.5 w-3 align-[0px]"
      role="img"
      aria-label={withdrawn ? 'release withdrawn' : 'released'}
    >
      <path
        d="M6 .8L11.3 9.4H.7z"
        className={withdrawn ? 'fill-none stroke-ink-soft' : 'fill-brass stroke-brass'}
        strokeWidth="1"
      />
    </svg>
  );
}
