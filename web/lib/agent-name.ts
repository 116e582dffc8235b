const BROWSERS: readonly [RegExp, string][] = [
  [/\bEdg/, 'Edge'],
  [/\bOPR\//, 'Opera'],
  [/\bFirefox\//, 'Firefox'],
  [/Chrom(?:e|ium)\//, 'Chrome'],
  [/\bSafari\//, 'Safari'],
];
const SYSTEMS: readonly [RegExp, string][] = [
  [/Android/, 'Android'],
  [/iPhone|iPad/, 'iOS'],
  [/Windows/, 'Windows'],
  [/Mac OS X|Macintosh/, 'macOS'],
  [/CrOS/, 'ChromeOS'],
  [/Linux|X11/, 'Linux'],
];

/** A browser's own long name in the few words by which people know it: Firefox on Linux. Others stay as they are. */
export function agentName(agent: string): string {
  if (agent === '') return 'unknown';
  const named = (names: readonly [RegExp, string][]) => names.find(([pattern]) => pattern.test(agent))?.[1];
  const browser = named(BROWSERS);
  if (browser === undefined) return agent;
  const system = named(SYSTEMS);
  return system === undefined ? browser : `${browser} on ${system}`;
}
