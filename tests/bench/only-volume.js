// The yardstick: reading a binary STL and the bare volume integral in one loop; no hash, no check, no tensor.
import { readFileSync } from 'node:fs';

const bytes = readFileSync(process.argv[2]);
const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
const count = view.getUint32(80, true);
let six = 0;
for (let i = 0, at = 84; i < count; i++, at += 50) {
  const f = (k) => view.getFloat32(at + 12 + 4 * k, true);
  const [ax, ay, az, bx, by, bz, cx, cy, cz] = [f(0), f(1), f(2), f(3), f(4), f(5), f(6), f(7), f(8)];
  six += ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
}
if (!(six > 0)) throw new Error('no volume');
