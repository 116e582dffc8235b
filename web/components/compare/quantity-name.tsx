import { quantityWords } from './quantity-words.ts';

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
