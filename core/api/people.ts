import * as z from 'zod';

export const ROLES = ['viewer', 'engineer', 'approver', 'administrator'] as const;
export const roleSchema = z.enum(ROLES);
export type Role = z.infer<typeof roleSchema>;
/** What a membership can be; administrator is server-wide. */
export const memberRoleSchema = z.enum(['viewer', 'engineer', 'approver']);

export const PASSWORD_AT_LEAST = 12;

const name = z.string().trim().min(1).max(100);
export const emailSchema = z.email().max(254);
/** Length alone is judged here; the server refuses common ones. bcrypt reads 72 bytes. */
export const passwordSchema = z.string().min(PASSWORD_AT_LEAST).max(72);

/** Which mail a person wants. */
export const mailChoicesSchema = z.object({
  limits: z.boolean().describe('a limit newly broken on a watched branch'),
  releases: z.boolean().describe('a release asked for, made or withdrawn'),
});

export const sessionSchema = z
  .object({
    person: z
      .object({ id: z.number(), name: z.string(), email: z.string(), administrator: z.boolean() })
      .nullable()
      .describe('null where nobody is signed in'),
    demo: z.boolean().describe('the server shows its mail and its sign-ins'),
    demoSignIns: z.array(z.object({ email: z.string(), password: z.string(), role: z.string() })),
  })
  .meta({ id: 'Session' });
export type Session = z.infer<typeof sessionSchema>;

export const signInSchema = z.object({ email: z.string().max(254), password: z.string().max(1000) });
export const askResetSchema = z.object({ email: z.string().max(254) });
export const newPasswordSchema = z.object({ password: passwordSchema });
export const changePasswordSchema = z.object({ current: z.string().max(1000), password: passwordSchema });
export const accountSchema = z.object({
  name: z.string(),
  email: z.string(),
  mail: mailChoicesSchema,
  sessions: z.array(
    z.object({ since: z.string(), lastSeen: z.string(), agent: z.string(), here: z.boolean() }),
  ),
});
export type Account = z.infer<typeof accountSchema>;
export const changeAccountSchema = z.object({ name: name.optional(), mail: mailChoicesSchema.optional() });

export const invitationSchema = z.object({
  id: z.number(),
  email: z.string(),
  role: memberRoleSchema,
  invitedBy: z.string(),
  at: z.string(),
  expiresAt: z.string(),
  state: z.enum(['open', 'expired']),
});
export type Invitation = z.infer<typeof invitationSchema>;
export const inviteSchema = z.object({ email: emailSchema, role: memberRoleSchema });
/** What the one who was invited sees before accepting. */
export const openInvitationSchema = z.object({
  email: z.string(),
  project: z.string(),
  role: memberRoleSchema,
  hasAccount: z.boolean().describe('then the account takes the role, and no password is asked for'),
});
export type OpenInvitation = z.infer<typeof openInvitationSchema>;
export const acceptInvitationSchema = z.object({
  name: name.optional(),
  password: passwordSchema.optional(),
});

export const memberSchema = z.object({
  person: z.number(),
  name: z.string(),
  email: z.string(),
  role: memberRoleSchema,
  active: z.boolean(),
});
export type Member = z.infer<typeof memberSchema>;
export const setMemberSchema = z.object({ role: memberRoleSchema });

export const personSchema = z.object({
  id: z.number(),
  name: z.string(),
  email: z.string(),
  administrator: z.boolean(),
  active: z.boolean(),
  lastSeen: z.string().nullable(),
  projects: z.array(z.object({ project: z.string(), role: memberRoleSchema })),
});
export type Person = z.infer<typeof personSchema>;
export const changePersonSchema = z.object({
  administrator: z.boolean().optional(),
  active: z.boolean().optional(),
});

export const tokenSchema = z.object({
  id: z.number(),
  kind: z.enum(['person', 'machine']),
  label: z.string(),
  owner: z.string().describe('who made it'),
  scope: z.enum(['read', 'push']),
  createdAt: z.string(),
  expiresAt: z.string(),
  lastUsedAt: z.string().nullable(),
  revokedAt: z.string().nullable(),
  mayRevoke: z.boolean(),
});
export type Token = z.infer<typeof tokenSchema>;
export const createTokenSchema = z.object({
  kind: z.enum(['person', 'machine']),
  label: name,
  scope: z.enum(['read', 'push']),
  days: z.number().int().min(1).max(730).describe('until it expires'),
});
export const createdTokenSchema = z.object({ token: tokenSchema, secret: z.string().describe('shown once') });
export type CreatedToken = z.infer<typeof createdTokenSchema>;

export const auditEntrySchema = z.object({
  id: z.string(),
  at: z.string(),
  who: z.string(),
  action: z.string().describe('such as release.made, token.revoked, member.role'),
  project: z.string().nullable(),
  what: z.string().describe('in a sentence'),
  address: z.string().nullable(),
});
export type AuditEntry = z.infer<typeof auditEntrySchema>;

export const mailSchema = z.object({
  id: z.string(),
  at: z.string(),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
});
export type Mail = z.infer<typeof mailSchema>;
