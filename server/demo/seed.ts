import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { CreationAttributes } from 'sequelize';
import type { Provenance, RollUpRecord } from '#core/record/record.ts';
import type { UploadResult } from '../compute/tasks.ts';
import { inTransaction } from '../database.ts';
import type { Deps } from '../deps.ts';
import type { Caller } from '../middleware/caller.ts';
import { AuditEntry, Comment, Membership, Person, Project, Release, Run, Token } from '../models/index.ts';
import { projectRoot } from '../project-root.ts';
import { DEMO_PASSWORD } from '../services/demo-sign-ins.ts';
import { keepInput } from '../services/inputs.ts';
import { hashPassword } from '../services/passwords.ts';
import { pushRuns } from '../services/push-runs.ts';
import { hashSecret, newSecret } from '../services/secrets.ts';
import { version } from '../version.ts';
import { BEGINNING, COMMITS, type DemoCommit, type DemoEdit, type Pusher } from './history.ts';
import { authorOf, TEAM, type Who } from './people.ts';

const SLUG = 'petrel';
/** Until all of it is there: a start that was interrupted begins anew. */
const UNFINISHED = 'petrel-in-the-making';
const DAY = 86_400_000;
const HOUR = 3_600_000;

type Files = Map<string, Buffer>;

/** Fills an empty server with the demo: a history of edits, rolled up by the core as it would have been then. */
export async function seedDemo(deps: Deps, tell: (line: string) => void): Promise<void> {
  if (await Project.findOne({ where: { slug: SLUG } })) return;
  await Project.destroy({ where: { slug: UNFINISHED } });
  if ((await Project.count()) > 0) return;
  const people = await makePeople(deps);
  const project = await Project.create({ slug: UNFINISHED, name: 'Petrel' });
  // Under its name of later, which stands in mail.
  project.slug = SLUG;
  const callers = await makeCallers(project, people);
  const files = apply(readExamples(), BEGINNING);
  const stage: Stage = { project, people, callers, start: Date.now(), trail: [] };
  for (const [i, commit] of COMMITS.entries()) {
    tell(`making the demo: ${i + 1} of ${COMMITS.length} commits`);
    apply(files, commit.edits);
    await pushCommit(commit, i, files, stage, deps);
  }
  await AuditEntry.bulkCreate(stage.trail.sort((a, b) => a.at.getTime() - b.at.getTime()));
  await Project.update({ slug: SLUG }, { where: { id: project.id } });
}

interface Stage {
  readonly project: Project;
  readonly people: Readonly<Record<Who, Person>>;
  readonly callers: Readonly<Record<'ci' | Pusher, Caller>>;
  readonly start: number;
  /** What the audit trail tells, to be written in the order of time. */
  readonly trail: Trail[];
}

type Trail = CreationAttributes<AuditEntry> & { at: Date };

async function makePeople({ config }: Deps): Promise<Record<Who, Person>> {
  const passwordHash = await hashPassword(DEMO_PASSWORD, Math.min(config.PASSWORD_COST, 10));
  const made: [string, Person][] = [];
  for (const [who, { name, email }] of Object.entries(TEAM)) {
    const defaults = { email, name, passwordHash, administrator: who === 'bram' };
    const [person] = await Person.findOrCreate({ where: { email }, defaults });
    made.push([who, person]);
  }
  return Object.fromEntries(made) as Record<Who, Person>;
}

async function makeCallers(project: Project, people: Record<Who, Person>): Promise<Stage['callers']> {
  for (const [who, { role }] of Object.entries(TEAM))
    if (role) await Membership.create({ projectId: project.id, personId: people[who as Who].id, role });
  const token = (kind: 'person' | 'machine', label: string, person: Person) =>
    Token.create({
      projectId: project.id,
      personId: person.id,
      kind,
      label,
      scope: 'push',
      // Nobody knows it: the demo's pushes are made here.
      secretHash: hashSecret(newSecret()),
      expiresAt: new Date(Date.now() + 365 * DAY),
      createdAt: new Date(Date.now() - 160 * DAY),
    });
  const byHand = (person: Person, made: Token): Caller => ({ person, session: null, token: made });
  const ci = await token('machine', 'CI', people.noor);
  const entries = await Promise.all(
    (['noor', 'tomas'] as const).map(
      async (who) => [who, byHand(people[who], await token('person', 'laptop', people[who]))] as const,
    ),
  );
  return { ...Object.fromEntries(entries), ci: byHand(people.noor, ci) } as Stage['callers'];
}

/** Every file of the examples that an assembly could name. */
function readExamples(): Files {
  const root = join(projectRoot(), 'examples');
  const files: Files = new Map();
  for (const folder of ['survey-drone', 'spinner', 'two-link-arm'])
    for (const name of readdirSync(join(root, folder)))
      if (/\.(yaml|stl)$/.test(name)) files.set(`${folder}/${name}`, readFileSync(join(root, folder, name)));
  return files;
}

function apply(files: Files, edits: readonly DemoEdit[]): Files {
  for (const { file, from, to } of edits) {
    const text = files.get(file)!.toString('utf8');
    if (text.split(from).length !== 2) throw new Error(`the demo expects '${from}' once in ${file}`);
    files.set(file, Buffer.from(text.replace(from, to)));
  }
  return files;
}

async function pushCommit(
  commit: DemoCommit,
  index: number,
  files: Files,
  stage: Stage,
  deps: Deps,
): Promise<void> {
  const at = new Date(stage.start - commit.daysAgo * DAY - (index % 7) * HOUR);
  const result: UploadResult = await deps.computer.rollUp({
    kind: 'upload',
    top: commit.top,
    state: null,
    files: [...files].map(([path, content]) => ({ path, content })),
    tool: '',
    at: '',
  });
  if ('faults' in result) throw new Error(`the demo does not roll up: ${result.faults[0]!.message}`);
  const provenance = provenanceOf(commit, index, at);
  const { project, callers } = stage;
  await keepInputs(result.records, files, project.id, deps);
  const runs = result.records.map((record, i) => ({
    record: { ...record, provenance },
    key: `demo-${index}`,
    drawing: result.drawings[i]!,
    at: new Date(at.getTime() + i * 1000),
  }));
  const caller = callers[commit.pushedBy ?? 'ci'];
  const answers = await pushRuns(runs, caller, { project, role: 'engineer' }, deps);
  const ids = answers.map(({ id }) => id!);
  const released = ids.filter(
    (_, i) => !commit.release?.state || result.records[i]!.state === commit.release.state,
  );
  for (const run of commit.release ? released : []) await makeRelease(run, commit, at, stage, deps);
  for (const { by, hours, text } of commit.comments ?? [])
    await Comment.create({
      projectId: project.id,
      runId: ids[0]!,
      personId: stage.people[by].id,
      text,
      createdAt: new Date(at.getTime() + hours * HOUR),
    });
}

const provenanceOf = (
  { message, by, branch, dirty, pushedBy }: DemoCommit,
  index: number,
  at: Date,
): Provenance => ({
  tool: `steelyard ${version}`,
  node: process.version,
  commit: createHash('sha1').update(`${index} ${message}`).digest('hex'),
  branch: branch ?? 'main',
  remote: 'https://git.petrel.example/petrel/machines.git',
  author: authorOf(by),
  dirty: dirty ?? false,
  ...(!pushedBy && { ci: { name: 'Petrel CI', run: String(400 + index) } }),
  at: at.toISOString(),
});

async function keepInputs(records: readonly RollUpRecord[], files: Files, projectId: number, deps: Deps) {
  const inputs = new Map(records.flatMap((r) => r.inputs.map((input) => [input.sha256, input] as const)));
  for (const { sha256, path, text } of inputs.values())
    await keepInput(projectId, sha256, text === undefined ? files.get(path)! : Buffer.from(text), deps);
}

async function makeRelease(
  runId: string,
  { release, message }: DemoCommit,
  at: Date,
  stage: Stage,
  deps: Deps,
) {
  const { preparedBy, checkedBy, approvedBy, reason, withdrawn } = release!;
  const { people, project } = stage;
  const after = (hours: number) => new Date(at.getTime() + hours * HOUR);
  const state = withdrawn ? 'withdrawn' : approvedBy ? 'released' : 'asked';
  await inTransaction(deps.sequelize, async (transaction) => {
    await Release.create(
      {
        projectId: project.id,
        runId,
        state,
        preparedBy: people[preparedBy].id,
        preparedName: people[preparedBy].name,
        preparedAt: after(2),
        ...(checkedBy && {
          checkedBy: people[checkedBy].id,
          checkedName: people[checkedBy].name,
          checkedAt: after(20),
        }),
        ...(approvedBy && {
          approvedBy: people[approvedBy].id,
          approvedName: people[approvedBy].name,
          approvedAt: after(30),
          reason: reason ?? null,
        }),
        ...(withdrawn && {
          withdrawnBy: people[withdrawn.by].id,
          withdrawnName: people[withdrawn.by].name,
          withdrawnAt: after(withdrawn.days * 24),
          withdrawnReason: withdrawn.reason,
        }),
      },
      { transaction },
    );
    await Run.update({ release: state }, { where: { id: runId }, transaction });
    const note = (who: Who, action: string, hours: number, what: string) =>
      stage.trail.push({
        who: people[who].name,
        action,
        project: SLUG,
        what: `${what} run ${runId} (${message})`,
        address: null,
        at: after(hours),
      });
    note(preparedBy, 'release.asked', 2, 'asked for the release of');
    if (checkedBy) note(checkedBy, 'release.checked', 20, 'checked');
    if (approvedBy) note(approvedBy, 'release.made', 30, 'released');
    if (withdrawn) note(withdrawn.by, 'release.withdrawn', withdrawn.days * 24, 'withdrew the release of');
  });
}
