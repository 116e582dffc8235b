/** `inertia.xy` → `Ixy about the centre`, `principal.x` → `principal moment near x`. */
export function quantityWords(name: string): string {
  const [kind = '', which = ''] = name.split('.');
  if (kind === 'inertia') return `I${which} about the centre`;
  if (kind === 'origin') return `I${which} about the origin`;
  if (kind === 'principal')
    return which.includes('+')
      ? `sum of the principal moments near ${which.split('+').join(' and ')}`
      : `principal moment near ${which}`;
  if (kind === 'gyration') return `radius of gyration ${which}`;
  return which === '' ? kind : `${kind} ${which}`;
}
