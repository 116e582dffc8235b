const RAISED: Record<string, string> = {
  '-': '⁻',
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
};

/** −3 → `⁻³`. */
export const raised = (power: number): string => [...String(power)].map((c) => RAISED[c] ?? c).join('');

/** A unit as it is read: `g*mm^2` → `g·mm²`, `deg` → `°`; the unit of a plain number is empty. */
export function unitText(unit: string): string {
  if (unit === '1' || unit === '') return '';
  if (unit === 'deg') return '°';
  return unit.replaceAll('*', '·').replace(/\^(-?\d+)/g, (_, power: string) => raised(Number(power)));
}
