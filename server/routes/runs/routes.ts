import { gunzipSync } from 'node:zlib';
import { formatCsv } from '#core/record/record-csv.ts';
import { Choice, Input } from '../../models/index.ts';
import { notFound } from '../../problem.ts';
import { compareRuns as compare } from '../../services/compare-runs.ts';
import { listRuns as findPage } from '../../services/history.ts';
import { historyCsv } from '../../services/history-csv.ts';
import { textOf } from '../../services/inputs.ts';
import { describeRun, findBaseline, findRun, type WholeRun } from '../../services/run-detail.ts';
import { findTrend } from '../../services/trend.ts';
import { urdfInertial } from '../../services/urdf.ts';
import { largeNumber } from '../numbers.ts';
import { type AskedInProject, type Handler, SENT } from '../route.ts';

const listRuns: Handler<'listRuns'> = ({ access, query, deps }) =>
  findPage(deps.sequelize, access.project.id, query);

const listRunsAsCsv: Handler<'listRunsAsCsv'> = async ({ access, query, deps, response }) => {
  const { rows } = await findPage(deps.sequelize, access.project.id, query);
  return sendFile(response, `${access.project.slug}-runs.csv`, 'text/csv; charset=utf-8', historyCsv(rows));
};

function sendFile(
  response: AskedInProject<'showRun'>['response'],
  name: string,
  type: string,
  text: string,
): typeof SENT {
  const safe = name.replace(/[^\w.-]+/g, '-');
  response.set('Content-Disposition', `attachment; filename="${safe}"`).type(type).send(text);
  return SENT;
}

const CHOICES_AT_MOST = 1000;

const listChoices: Handler<'listChoices'> = async ({ access }) => {
  const of = async (kind: Choice['kind']) => {
    const where = { projectId: access.project.id, kind };
    return (await Choice.findAll({ where, order: ['value'], limit: CHOICES_AT_MOST })).map((c) => c.value);
  };
  const [assemblies, states, branches] = await Promise.all([of('assembly'), of('state'), of('branch')]);
  return { assemblies, states, branches };
};

const showTrend: Handler<'showTrend'> = ({ access, query, deps }) =>
  findTrend(deps.sequelize, access.project.id, query);

type OfRun = {
  readonly access: AskedInProject<'showRun'>['access'];
  readonly places: Readonly<Record<string, string>>;
};

const wholeRun = ({ access, places }: OfRun): Promise<WholeRun> =>
  findRun(access.project.id, largeNumber(places.run));

const showRun: Handler<'showRun'> = async (asked) =>
  describeRun(asked.deps.sequelize, await wholeRun(asked), asked.caller, asked.access);

const showInputs: Handler<'showInputs'> = async (asked) => {
  const { record } = await wholeRun(asked);
  const found = await inputsOf(record.inputs, asked.access.project.id);
  return Promise.all(
    record.inputs.map(async ({ path, sha256, bytes }) => {
      const input = found.get(sha256);
      return { path, sha256, text: input ? await textOf(input) : null, bytes: bytes ?? null };
    }),
  );
};

async function inputsOf(
  inputs: readonly { sha256: string }[],
  projectId: number,
): Promise<Map<string, Input>> {
  const found = await Input.findAll({ where: { projectId, sha256: inputs.map((i) => i.sha256) } });
  return new Map(found.map((input) => [input.sha256, input]));
}

/** The record as the command printed it: with the texts of its inputs, but for meshes. */
const downloadRecord: Handler<'downloadRecord'> = async (asked) => {
  const { record, run } = await wholeRun(asked);
  const found = await inputsOf(record.inputs, asked.access.project.id);
  const inputs = record.inputs.map(({ path, sha256, bytes }) => {
    const input = found.get(sha256);
    const text = input && bytes === undefined ? gunzipSync(input.content).toString('utf8') : undefined;
    return { path, sha256, ...(text !== undefined && { text }), ...(bytes !== undefined && { bytes }) };
  });
  const { provenance, inputs: _, ...rest } = record;
  const text = `${JSON.stringify([{ ...rest, inputs, provenance }], null, 2)}\n`;
  return sendFile(asked.response, `${run.assembly}-${run.state}-${run.id}.json`, 'application/json', text);
};

const downloadParts: Handler<'downloadParts'> = async (asked) => {
  const { record, run } = await wholeRun(asked);
  return sendFile(
    asked.response,
    `${run.assembly}-${run.state}-${run.id}.csv`,
    'text/csv; charset=utf-8',
    formatCsv([record]),
  );
};

const downloadUrdf: Handler<'downloadUrdf'> = async (asked) => {
  const { record, run } = await wholeRun(asked);
  const text = urdfInertial(record);
  if (!text) throw notFound('a centre of mass in this run');
  return sendFile(asked.response, `${run.assembly}-${run.state}-${run.id}.urdf`, 'application/xml', text);
};

const downloadDrawing: Handler<'downloadDrawing'> = async (asked) => {
  const { stored } = await wholeRun(asked);
  if (!stored.drawing)
    throw notFound('a drawing of this run; the server draws it when it has computed the run again');
  asked.response
    // The drawing carries its own style and nothing that runs.
    .set('Content-Security-Policy', "default-src 'none'; style-src 'unsafe-inline'")
    .type('image/svg+xml')
    .send(stored.drawing);
  return SENT;
};

const compareRuns: Handler<'compareRuns'> = async ({ access, query, deps }) => {
  const b = await findRun(access.project.id, largeNumber(query.b));
  const a =
    query.a === 'baseline'
      ? await baselineOf(b, access, deps)
      : await findRun(access.project.id, largeNumber(query.a));
  return compare(deps.sequelize, a, b, query.on);
};

async function baselineOf(
  { run }: WholeRun,
  { project }: AskedInProject<'showRun'>['access'],
  { sequelize }: AskedInProject<'showRun'>['deps'],
): Promise<WholeRun> {
  const baseline = await findBaseline(sequelize, run);
  if (!baseline) throw notFound(`a released run of ${run.assembly}, ${run.state}, before this one`);
  return findRun(project.id, baseline.id);
}

export const runRoutes = {
  listRuns,
  listRunsAsCsv,
  listChoices,
  showTrend,
  showRun,
  showInputs,
  downloadRecord,
  downloadParts,
  downloadUrdf,
  downloadDrawing,
  compareRuns,
};
