import * as z from 'zod';
import { roleSchema } from './people.ts';

export const slugSchema = z
  .string()
  .regex(/^[a-z0-9](?:[a-z0-9-]{0,58}[a-z0-9])?$/)
  .describe('in addresses: small letters, digits and hyphens');

export const projectSchema = z
  .object({
    slug: z.string(),
    name: z.string(),
    role: roleSchema.describe('yours; administrator where you are one'),
    runs: z.number(),
    latest: z.string().nullable().describe('when the last run came'),
    watchedBranches: z.array(z.string()).describe('a limit newly broken on one of them is told by mail'),
  })
  .meta({ id: 'Project' });
export type Project = z.infer<typeof projectSchema>;

export const createProjectSchema = z.object({ slug: slugSchema, name: z.string().trim().min(1).max(100) });
export const changeProjectSchema = z.object({
  name: z.string().trim().min(1).max(100).optional(),
  watchedBranches: z.array(z.string().min(1).max(200)).max(20).optional(),
});
/** Typed by hand, for a project goes with all its runs. */
export const removeProjectSchema = z.object({ slug: z.string() });
