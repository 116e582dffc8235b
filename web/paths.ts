/** Every page: its route pattern and how a link to it is built, side by side. */

const slug = (text: string) => encodeURIComponent(text);

export const PATHS = {
  projects: '/',
  signIn: '/sign-in',
  askReset: '/reset',
  reset: '/reset/:link',
  invitation: '/invitation/:link',
  mailStop: '/mail-stop/:link',
  history: '/projects/:project',
  run: '/projects/:project/runs/:run',
  compare: '/projects/:project/compare',
  upload: '/projects/:project/upload',
  members: '/projects/:project/people',
  tokens: '/projects/:project/tokens',
  settings: '/projects/:project/settings',
  people: '/people',
  audit: '/audit',
  account: '/account',
  mail: '/mail',
} as const;

export const linkTo = {
  signIn: (then?: string) => `/sign-in${then && then !== '/' ? `?to=${encodeURIComponent(then)}` : ''}`,
  history: (project: string) => `/projects/${slug(project)}`,
  run: (project: string, run: string) => `/projects/${slug(project)}/runs/${slug(run)}`,
  /** `a` is a run or `baseline`. */
  compare: (project: string, a: string, b: string) =>
    `/projects/${slug(project)}/compare?${new URLSearchParams({ a, b })}`,
  upload: (project: string) => `/projects/${slug(project)}/upload`,
  members: (project: string) => `/projects/${slug(project)}/people`,
  tokens: (project: string) => `/projects/${slug(project)}/tokens`,
  settings: (project: string) => `/projects/${slug(project)}/settings`,
} as const;
