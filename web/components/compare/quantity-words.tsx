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

/** At the head of a row in a table that says about which point, the axes lowered. */
export function QuantityName({ name }: { name: string }) {
  const [kind = '', which = ''] = name.split('.');
  if (kind === 'inertia' || kind === 'origin')
    return (
      <>
        I<sub>{which}</sub>
      </>
    );
  const words = quantityWords(name);
  return words.charAt(0).toUpperCase() + words.slice(1);
}
