import type { SolidKey, SolidKind } from '#core/solids/dimensions.ts';
import { SOLIDS } from '#core/solids/registry.ts';
import { toAscii } from '../output/glyphs.ts';
import { wrap } from '../output/text-width.ts';
import type { Context } from './context.ts';

/** A mesh is a solid of the format but not of the registry: it needs a file. */
const MESH = {
  name: 'mesh',
  family: 'solid' as const,
  about: 'a triangle mesh: STL (binary or ASCII) or OBJ',
  origin: 'its own axes',
  keys: [
    ['file', 'path, relative to the assembly file'],
    ['unit', 'unit of length in which the file was exported; required'],
    ['fill', 'solid (the default), or shell with a thickness'],
    ['thickness', 'of a shell'],
    ['weld', 'corners nearer than this are one; exact where left out'],
  ] as const,
};

export const SOLID_HELP_NAMES: readonly string[] = [...SOLIDS.map((s) => s.name), MESH.name];

/** The list of solids, or one of them with its keys. */
export function describeSolids(name: string | undefined, format: 'table' | 'json', context: Context): string {
  const all = [...SOLIDS.map(describe), describeMesh()];
  const chosen = name === undefined ? all : all.filter((s) => s.name === name);
  if (format === 'json') return `${JSON.stringify(chosen, null, 2)}\n`;
  const columns = Math.max(40, Math.min(context.io.columns ?? 80, 100));
  const said =
    name === undefined ? listText(all, columns) : chosen.map((s) => detailText(s, columns)).join('\n');
  return context.unicode ? said : toAscii(said);
}

/** A text behind a label, in lines no wider than `columns`; the later ones stand below its start. */
const hung = (label: string, text: string, columns: number): string[] =>
  wrap(text, columns - label.length).map((line, i) => (i === 0 ? label : ' '.repeat(label.length)) + line);

interface Described {
  readonly name: string;
  readonly about: string;
  readonly origin: string;
  readonly mass: string;
  readonly keys: readonly { name: string; about: string; or: readonly string[]; required: boolean }[];
}

const MASS_FROM: Record<SolidKind['family'], string> = {
  solid: 'mass, or a density (material)',
  thin: 'mass, or thickness with a density (material)',
  line: 'mass',
};

const describe = (solid: SolidKind): Described => ({
  name: solid.name,
  about: solid.about,
  origin: solid.origin,
  mass: solid.name === 'ring' ? 'mass' : MASS_FROM[solid.family],
  keys: solid.keys.map((key: SolidKey) => ({
    name: key.name,
    about: key.about,
    or: (key.twins ?? []).map((twin) => twin.name),
    required: key.default === undefined,
  })),
});

const describeMesh = (): Described => ({
  name: MESH.name,
  about: MESH.about,
  origin: MESH.origin,
  mass: 'mass, or a density (material)',
  keys: MESH.keys.map(([name, about]) => ({
    name,
    about,
    or: [],
    required: name === 'file' || name === 'unit',
  })),
});

function listText(all: readonly Described[], columns: number): string {
  const width = Math.max(...all.map((s) => s.name.length));
  const lines = all.flatMap((s) => {
    const keys = s.keys.map((k) => (k.required ? k.name : `[${k.name}]`)).join(' ') || '(none)';
    return [
      ...hung(`  ${s.name.padEnd(width)}  `, keys, columns),
      ...hung(`  ${' '.repeat(width)}  origin: `, s.origin, columns),
    ];
  });
  const paragraphs = [wrap(HEAD, columns), lines, [MORE]];
  return `${paragraphs.map((paragraph) => paragraph.join('\n')).join('\n\n')}\n`;
}

const HEAD =
  'Solids. Local axes x, y, z; the axis of anything round is z; lengths are full sizes. Each diameter, bore and section has a twin in radius. [optional] in brackets.';
const MORE = 'steelyard solids NAME says what each key means.';

function detailText(s: Described, columns: number): string {
  const width = Math.max(4, ...s.keys.map((k) => k.name.length));
  const keys = s.keys.flatMap((k) => {
    const or = k.or.length > 0 ? ` (or ${k.or.join(', ')})` : '';
    const about = `${k.about}${or}${k.required ? '' : '; may be left out'}`;
    return hung(`  ${k.name.padEnd(width)}  `, about, columns);
  });
  const inside = s.keys.filter((k) => k.required).map((k) => `${k.name}: …`);
  const example = s.keys.length === 0 ? `solid: ${s.name}` : `solid: { ${s.name}: { ${inside.join(', ')} } }`;
  const head = [
    ...hung(`${s.name}: `, s.about, columns),
    ...hung('  origin: ', s.origin, columns),
    ...hung('  takes:  ', s.mass, columns),
  ];
  return `${head.join('\n')}

${keys.length > 0 ? `${keys.join('\n')}\n\n` : ''}${hung('  ', example, columns).join('\n')}
`;
}
