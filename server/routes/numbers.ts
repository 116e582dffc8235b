/** A place in an address that must be a positive whole number; nothing is found under 0. */
export function smallNumber(text: string | undefined): number {
  const value = Number(text);
  return Number.isInteger(value) && value > 0 && value < 2 ** 31 ? value : 0;
}

/** The same for the larger keys, which stay text. */
export const largeNumber = (text: string | undefined): string =>
  /^[1-9]\d{0,17}$/.test(text ?? '') ? text! : '0';
