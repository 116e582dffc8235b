import * as z from 'zod';
import * as people from './people.ts';
import * as projects from './projects.ts';
import * as push from './push.ts';
import type { RouteName } from './routes.ts';
import * as runs from './runs.ts';

/** What a request takes and what it answers; for checking, for the OpenAPI document and for types. */
export interface Exchange {
  readonly summary: string;
  readonly query?: z.ZodObject;
  readonly body?: z.ZodType;
  /** JSON unless `media` says otherwise; null where the answer has no body. */
  readonly answer: z.ZodType | null;
  readonly media?: string;
  /** Of a request that is not JSON. */
  readonly takes?: string;
}

const list = <T extends z.ZodType>(items: T) => z.array(items);
const file = z.string();

export const CONTRACT = {
  health: { summary: 'The process lives', answer: z.object({ status: z.literal('ok') }) },
  ready: { summary: 'The database answers', answer: z.object({ status: z.enum(['ready', 'not ready']) }) },
  openApi: { summary: 'This document', answer: z.unknown() },

  showSession: { summary: 'Who is signed in', answer: people.sessionSchema },
  signIn: { summary: 'Sign in', body: people.signInSchema, answer: people.sessionSchema },
  signOut: { summary: 'Sign out here', answer: null },
  signOutEverywhere: { summary: 'End all your sessions', answer: null },
  askReset: { summary: 'Ask for a link that sets a new password', body: people.askResetSchema, answer: null },
  resetPassword: { summary: 'Set a new password by a link', body: people.newPasswordSchema, answer: null },
  showInvitation: { summary: 'What a link invites to', answer: people.openInvitationSchema },
  acceptInvitation: {
    summary: 'Accept an invitation',
    body: people.acceptInvitationSchema,
    answer: people.sessionSchema,
  },
  stopMail: { summary: 'Stop mail, by the link in it', answer: null },

  showAccount: { summary: 'Your account', answer: people.accountSchema },
  changeAccount: { summary: 'Change your name or mail', body: people.changeAccountSchema, answer: null },
  changePassword: { summary: 'Change your password', body: people.changePasswordSchema, answer: null },

  listProjects: { summary: 'Your projects', answer: list(projects.projectSchema) },
  createProject: {
    summary: 'Start a project',
    body: projects.createProjectSchema,
    answer: projects.projectSchema,
  },
  showProject: { summary: 'One project', answer: projects.projectSchema },
  changeProject: {
    summary: 'Change a project',
    body: projects.changeProjectSchema,
    answer: projects.projectSchema,
  },
  removeProject: {
    summary: 'Remove a project with all its runs',
    body: projects.removeProjectSchema,
    answer: null,
  },

  listMembers: { summary: 'Who works in a project', answer: list(people.memberSchema) },
  setMember: { summary: 'Give a role in a project', body: people.setMemberSchema, answer: null },
  removeMember: { summary: 'Take a role away', answer: null },
  listInvitations: { summary: 'Open invitations', answer: list(people.invitationSchema) },
  invite: { summary: 'Invite by mail', body: people.inviteSchema, answer: people.invitationSchema },
  withdrawInvitation: { summary: 'Withdraw an invitation', answer: null },
  listPeople: { summary: 'Everybody on this server', answer: list(people.personSchema) },
  changePerson: {
    summary: 'Make someone administrator, or shut an account',
    body: people.changePersonSchema,
    answer: null,
  },

  listTokens: { summary: 'Your tokens; everybody’s for an administrator', answer: list(people.tokenSchema) },
  createToken: {
    summary: 'Make a token; its secret is shown once',
    body: people.createTokenSchema,
    answer: people.createdTokenSchema,
  },
  revokeToken: { summary: 'Revoke a token', answer: null },

  listRuns: { summary: 'The history', query: runs.listRunsQuerySchema, answer: runs.runPageSchema },
  listRunsAsCsv: {
    summary: 'The same page of the history as CSV',
    query: runs.listRunsQuerySchema,
    answer: file,
    media: 'text/csv',
  },
  listChoices: { summary: 'What the history can be filtered by', answer: runs.choicesSchema },
  showTrend: {
    summary: 'One quantity over time',
    query: runs.trendQuerySchema,
    answer: runs.trendSchema.nullable(),
  },
  pushRuns: { summary: 'Send records', body: push.pushSchema, answer: push.pushedSchema },
  findMissingInputs: {
    summary: 'Which inputs the server does not have',
    body: push.missingInputsSchema,
    answer: push.missingInputsAnswerSchema,
  },
  putInput: {
    summary: 'Send one input by its hash',
    takes: 'application/octet-stream',
    answer: null,
  },
  upload: {
    summary: 'Compute an assembly on the server from its files',
    takes: 'multipart/form-data',
    answer: push.uploadedSchema,
  },

  showRun: { summary: 'One run', answer: runs.runDetailSchema },
  showInputs: { summary: 'The inputs of a run', answer: runs.inputTextsSchema },
  downloadRecord: { summary: 'The whole record', answer: file, media: 'application/json' },
  downloadParts: { summary: 'The parts as CSV', answer: file, media: 'text/csv' },
  downloadUrdf: { summary: 'The body as a URDF <inertial>', answer: file, media: 'application/xml' },
  downloadDrawing: { summary: 'Front, side and top', answer: file, media: 'image/svg+xml' },
  compareRuns: {
    summary: 'What moved between two runs',
    query: runs.comparisonQuerySchema,
    answer: runs.comparisonSchema,
  },

  addComment: { summary: 'Comment on a run', body: runs.addCommentSchema, answer: runs.commentSchema },
  removeComment: { summary: 'Remove a comment of yours', answer: null },
  askForRelease: { summary: 'Ask for a release', answer: runs.releaseSchema },
  markAsChecked: { summary: 'Say that you have checked a run', answer: runs.releaseSchema },
  releaseRun: {
    summary: 'Release a run as the baseline',
    body: runs.releaseReasonSchema,
    answer: runs.releaseSchema,
  },
  withdrawRelease: { summary: 'Withdraw a release', body: runs.withdrawalSchema, answer: runs.releaseSchema },

  listAudit: {
    summary: 'Every change of rights, release, token and deletion',
    query: z.object({ cursor: z.string().max(40).optional() }),
    answer: z.object({ entries: list(people.auditEntrySchema), next: z.string().nullable() }),
  },
  listDemoMail: { summary: 'Mail that the demo kept', answer: list(people.mailSchema) },
} as const satisfies Record<RouteName, Exchange>;

type Of<N extends RouteName, K extends string> = (typeof CONTRACT)[N] extends Record<K, infer S> ? S : never;
/** What a handler is given after checking. */
export type Body<N extends RouteName> = Of<N, 'body'> extends z.ZodType<infer T> ? T : undefined;
export type Query<N extends RouteName> =
  Of<N, 'query'> extends z.ZodObject ? z.output<Of<N, 'query'>> : Record<never, never>;
export type Answer<N extends RouteName> = Of<N, 'answer'> extends z.ZodType<infer T> ? T : null;
