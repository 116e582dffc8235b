import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { projectsQuery } from './api/projects.ts';
import { whenSignedIn } from './api/session.ts';
import { AdministratorsOnly } from './components/administrators-only.tsx';
import { Layout } from './components/layout.tsx';
import { NotFound } from './components/problem-page.tsx';
import { ProjectFrame, type RouteHandle } from './components/project-frame.tsx';
import { RouteError } from './components/route-error.tsx';
import { SignedIn } from './components/signed-in.tsx';
import { PATHS } from './paths.ts';

const figures: RouteHandle = { figures: true };

const open: RouteObject[] = [
  { path: PATHS.signIn, lazy: () => import('./routes/sign-in.tsx') },
  { path: PATHS.askReset, lazy: () => import('./routes/ask-reset.tsx') },
  { path: PATHS.reset, lazy: () => import('./routes/reset.tsx') },
  { path: PATHS.invitation, lazy: () => import('./routes/invitation.tsx') },
  { path: PATHS.mailStop, lazy: () => import('./routes/mail-stop.tsx') },
  { path: PATHS.mail, lazy: () => import('./routes/mail.tsx') },
];

const ofProject: RouteObject[] = [
  { index: true, handle: figures, lazy: () => import('./routes/history.tsx') },
  { path: PATHS.run, handle: figures, lazy: () => import('./routes/run.tsx') },
  { path: PATHS.compare, handle: figures, lazy: () => import('./routes/compare.tsx') },
  { path: PATHS.upload, handle: figures, lazy: () => import('./routes/upload.tsx') },
  { path: PATHS.members, lazy: () => import('./routes/members.tsx') },
  { path: PATHS.tokens, lazy: () => import('./routes/tokens.tsx') },
  { path: PATHS.settings, lazy: () => import('./routes/settings.tsx') },
];

const ofAdministrators: RouteObject[] = [
  { path: PATHS.people, lazy: () => import('./routes/people.tsx') },
  { path: PATHS.audit, lazy: () => import('./routes/audit.tsx') },
];

/** Before the first page's chunk is here. */
const Nothing = () => null;

/** The pages, each loaded when it is first looked at. */
export function createRouter(client: QueryClient) {
  // Starts with the page's own chunk and is not waited for.
  const prefetchProjects = () => {
    void whenSignedIn(client, () => void client.prefetchQuery(projectsQuery));
    return null;
  };
  return createBrowserRouter([
    {
      Component: Layout,
      ErrorBoundary: RouteError,
      HydrateFallback: Nothing,
      children: [
        ...open,
        {
          Component: SignedIn,
          loader: prefetchProjects,
          shouldRevalidate: () => false,
          children: [
            { path: PATHS.projects, lazy: () => import('./routes/projects.tsx') },
            { path: PATHS.account, lazy: () => import('./routes/account.tsx') },
            { Component: AdministratorsOnly, children: ofAdministrators },
            { path: PATHS.history, Component: ProjectFrame, children: ofProject },
          ],
        },
        { path: '*', Component: NotFound },
      ],
    },
  ]);
}
