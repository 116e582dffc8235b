import { formatSignificant } from '../../core/figures/index.ts';
import type { ReportContext } from './report-context.ts';

/** What was found in mesh files: nothing is mended or hulled in silence, and the size is the check of the unit. */
export function writeMeshes({ record, sheet, units }: ReportContext): void {
  const meshes = record.parts.flatMap(({ path, mesh }) => (mesh ? [{ path, mesh }] : []));
  if (meshes.length === 0) return;
  sheet.head('Meshes', `size along their own axes, ${units.length.text}`);
  const right = (head: string) => ({ head, align: 'right' as const });
  sheet.table(
    [
      { head: '', align: 'left' },
      { head: 'file', align: 'left' },
      right('triangles'),
      right('shells'),
      right('voids'),
      right('size'),
    ],
    meshes.map(({ path, mesh }) => [
      { text: path },
      { text: mesh.format },
      { text: String(mesh.triangles) },
      { text: String(mesh.shells) },
      { text: String(mesh.voids) },
      { text: mesh.size.map((s) => formatSignificant(s / units.length.factor, 4)).join(' × ') },
    ]),
  );
  for (const { path, mesh } of meshes)
    if (mesh.openEdges > 0)
      sheet.say(`${path}: open along ${mesh.openEdges} edges, taken as a shell`, { hang: 2 });
}
