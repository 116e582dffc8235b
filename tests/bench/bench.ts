// npm run bench: whole processes, each beside its yardstick, in turn (A B A B …) so that a drifting machine moves both.
// Prints ratios; never a verdict, for clocks differ between machines.
import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Table from 'cli-table3';
import { writeLargeAssembly, writeMeshAssembly, writeTorusStl } from './inputs.ts';
import { measure, median, type Sample } from './measure.ts';

const root = join(import.meta.dirname, '..', '..');
const folder = mkdtempSync(join(tmpdir(), 'steelyard-bench-'));
const cli = join(root, 'dist', 'cli', 'steelyard.js');
const runs = Number(process.env.BENCH_RUNS ?? 7);

interface Row {
  readonly what: string;
  readonly args: readonly string[];
  readonly beside: string;
  readonly yardstick: readonly string[];
  readonly target: number;
  /** Exit status that the command must have, or the row measures something else. */
  readonly status: number;
}

async function pair(row: Row): Promise<{ a: Sample[]; b: Sample[] }> {
  const a: Sample[] = [];
  const b: Sample[] = [];
  for (let i = 0; i <= runs; i++) {
    const one = await measure(row.args, root);
    const other = await measure(row.yardstick, root);
    if (one.status !== row.status)
      throw new Error(`${row.what}: exit status ${one.status}, expected ${row.status}`);
    if (i === 0) continue; // the first of each warms the disk's cache
    a.push(one);
    b.push(other);
  }
  return { a, b };
}

try {
  const large = join(folder, 'large.yaml');
  const faulty = join(folder, 'faulty.yaml');
  const stl = join(folder, 'torus.stl');
  const mesh = join(folder, 'mesh.yaml');
  writeLargeAssembly(large, 10_000, false);
  writeLargeAssembly(faulty, 10_000, true);
  process.stderr.write('writing a mesh of 1,000,000 triangles\n');
  writeTorusStl(stl, 1000, 500);
  writeMeshAssembly(mesh, 'torus.stl');
  const bare = ['-e', '0'];
  const rows: Row[] = [
    {
      what: 'steelyard --version',
      args: [cli, '--version'],
      beside: 'node -e 0',
      yardstick: bare,
      target: 1.5,
      status: 0,
    },
    {
      what: 'run, the demo of about 40 parts',
      args: [cli, 'run', 'examples/survey-drone/drone.yaml'],
      beside: 'node -e 0',
      yardstick: bare,
      target: 3,
      status: 0,
    },
    {
      what: 'run, 10,000 parts',
      args: [cli, 'run', large],
      beside: 'js-yaml alone',
      yardstick: [join(import.meta.dirname, 'only-parse-yaml.js'), large],
      target: 4,
      status: 0,
    },
    {
      what: 'run, 10,000 parts, a fault in the last line',
      args: [cli, 'run', faulty],
      beside: 'js-yaml alone',
      yardstick: [join(import.meta.dirname, 'only-parse-yaml.js'), faulty],
      target: 20,
      status: 2,
    },
    {
      what: 'run, a mesh of 1,000,000 triangles',
      args: [cli, 'run', mesh],
      beside: 'read and integrate',
      yardstick: [join(import.meta.dirname, 'only-volume.js'), stl],
      target: 10,
      status: 0,
    },
  ];
  const table = new Table({
    head: ['measured', 'ms', 'beside', 'ms', 'ratio', 'target'],
    style: { head: [], border: [] },
  });
  let meshPeak = Number.NaN;
  for (const row of rows) {
    process.stderr.write(`${row.what}\n`);
    const { a, b } = await pair(row);
    const ratios = a.map((sample, i) => sample.milliseconds / b[i]!.milliseconds);
    table.push([
      row.what,
      median(a.map((s) => s.milliseconds)).toFixed(0),
      row.beside,
      median(b.map((s) => s.milliseconds)).toFixed(0),
      median(ratios).toFixed(2),
      `≤ ${row.target}`,
    ]);
    if (row.what.includes('mesh')) meshPeak = median(a.map((s) => s.peak));
  }
  const floor = median(
    (await Promise.all([measure(['-e', 'setTimeout(() => 0, 50)'], root)])).map((s) => s.peak),
  );
  const size = statSync(stl).size / 2 ** 20;
  table.push([
    'memory of the mesh run above bare node',
    `${(meshPeak - floor).toFixed(0)} MiB`,
    'size of the file',
    `${size.toFixed(0)} MiB`,
    ((meshPeak - floor) / size).toFixed(2),
    '≤ 4',
  ]);
  process.stdout.write(`${table.toString()}\nmedians of ${runs} runs in turn, ${process.version}\n`);
} finally {
  rmSync(folder, { recursive: true, force: true });
}
