import { accountRoutes } from './account/routes.ts';
import { auditRoutes } from './audit/routes.ts';
import { commentRoutes } from './comments/routes.ts';
import { invitationRoutes } from './invitations/routes.ts';
import { mailRoutes } from './mail/routes.ts';
import { memberRoutes } from './members/routes.ts';
import { peopleRoutes } from './people/routes.ts';
import { projectRoutes } from './projects/routes.ts';
import { pushRoutes } from './push/routes.ts';
import { releaseRoutes } from './releases/routes.ts';
import type { Handlers } from './route.ts';
import { runRoutes } from './runs/routes.ts';
import { sessionRoutes } from './session/routes.ts';
import { systemRoutes } from './system/routes.ts';
import { tokenRoutes } from './tokens/routes.ts';
import { uploadRoutes } from './uploads/routes.ts';

/** Every route of core/api/routes.ts with what answers it; a route without one does not compile. */
export const handlers: Handlers = {
  ...systemRoutes,
  ...sessionRoutes,
  ...invitationRoutes,
  ...accountRoutes,
  ...projectRoutes,
  ...memberRoutes,
  ...peopleRoutes,
  ...tokenRoutes,
  ...runRoutes,
  ...pushRoutes,
  ...uploadRoutes,
  ...releaseRoutes,
  ...commentRoutes,
  ...auditRoutes,
  ...mailRoutes,
};
