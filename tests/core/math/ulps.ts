const double = new Float64Array(1);
const bits = new BigInt64Array(double.buffer);

/** How many doubles lie between two, counting the further one; 0 for the same value (−0 is 0). */
export function ulpsApart(a: number, b: number): number {
  const place = (x: number): bigint => {
    double[0] = x;
    const pattern = bits[0]!;
    return pattern < 0n ? -(pattern & 0x7fffffffffffffffn) : pattern;
  };
  const apart = place(a) - place(b);
  return Number(apart < 0n ? -apart : apart);
}
