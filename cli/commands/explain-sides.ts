import { explain } from '#core/why/explain.ts';
import { writeWhole } from '../io.ts';
import { renderExplanations } from '../output/explanations-report.ts';
import { formatJson } from '../output/formats/json.ts';
import type { Context } from './context.ts';
import { loadGiven } from './load-given.ts';
import { formatOfFile } from './options.ts';
import { WHY_FORMATS, type WhyOptions } from './why.ts';

/** The work of `why`: both tensors as they are declared, and the readings under which b is a. */
export async function explainSides(
  nameA: string,
  nameB: string,
  options: WhyOptions,
  context: Context,
): Promise<void> {
  const outputs = options.out.map((file) => ({ file, format: formatOfFile(file, options, WHY_FORMATS) }));
  const request = { states: options.state, set: options.set };
  const a = await loadGiven(nameA, request, context);
  const b = await loadGiven(nameB, request, context);
  const found = explain(a.given, b.given);
  const render = (format: string, to: Context | null) =>
    format === 'json'
      ? formatJson({ a: a.name, b: b.name, ...found })
      : renderExplanations(a.name, b.name, found, {
          width: Math.max(60, Math.min(to?.io.columns ?? 80, 100)),
          colour: to?.colour ?? false,
          unicode: to?.unicode ?? true,
        });
  for (const { file, format } of outputs) writeWhole(file, render(format, null));
  if (outputs.length === 0)
    context.io.out(render(options.format ?? (context.io.outIsTerminal ? 'table' : 'json'), context));
}
