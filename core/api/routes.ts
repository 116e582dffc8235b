/**
 * Every request that the server answers: method, path under /api, and who may ask. The server registers exactly these,
 * the tests try each with every role, the dashboard and the command build their addresses from them.
 *
 * `who`: `anyone`; `person` – whoever is signed in; a role in `:project` at least; `administrator`; `demo` – anyone, and
 * only where the server shows its mail. `token`: whether a token may ask, and the scope that it needs.
 */
export interface Route {
  readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  readonly path: string;
  readonly who: 'anyone' | 'person' | 'viewer' | 'engineer' | 'approver' | 'administrator' | 'demo';
  readonly token?: 'read' | 'push';
}

const get = (path: string, who: Route['who'], token?: Route['token']): Route =>
  route('GET', path, who, token);
const post = (path: string, who: Route['who'], token?: Route['token']): Route =>
  route('POST', path, who, token);
const route = (method: Route['method'], path: string, who: Route['who'], token?: Route['token']): Route => ({
  method,
  path,
  who,
  ...(token && { token }),
});

export const ROUTES = {
  health: get('/health', 'anyone'),
  ready: get('/ready', 'anyone'),
  openApi: get('/openapi.json', 'anyone'),

  showSession: get('/session', 'anyone'),
  signIn: post('/session', 'anyone'),
  signOut: route('DELETE', '/session', 'person'),
  signOutEverywhere: route('DELETE', '/sessions', 'person'),
  askReset: post('/resets', 'anyone'),
  resetPassword: post('/resets/:link', 'anyone'),
  showInvitation: get('/invitations/:link', 'anyone'),
  acceptInvitation: post('/invitations/:link', 'anyone'),
  stopMail: post('/mail-stops/:link', 'anyone'),

  showAccount: get('/account', 'person'),
  changeAccount: route('PATCH', '/account', 'person'),
  changePassword: post('/account/password', 'person'),

  listProjects: get('/projects', 'person'),
  createProject: post('/projects', 'administrator'),
  showProject: get('/projects/:project', 'viewer', 'read'),
  changeProject: route('PATCH', '/projects/:project', 'administrator'),
  removeProject: route('DELETE', '/projects/:project', 'administrator'),

  listMembers: get('/projects/:project/members', 'viewer'),
  setMember: route('PUT', '/projects/:project/members/:person', 'administrator'),
  removeMember: route('DELETE', '/projects/:project/members/:person', 'administrator'),
  listInvitations: get('/projects/:project/invitations', 'administrator'),
  invite: post('/projects/:project/invitations', 'administrator'),
  withdrawInvitation: route('DELETE', '/projects/:project/invitations/:invitation', 'administrator'),
  listPeople: get('/people', 'administrator'),
  changePerson: route('PATCH', '/people/:person', 'administrator'),

  listTokens: get('/projects/:project/tokens', 'viewer'),
  createToken: post('/projects/:project/tokens', 'engineer'),
  revokeToken: route('DELETE', '/projects/:project/tokens/:token', 'viewer'),

  listRuns: get('/projects/:project/runs', 'viewer', 'read'),
  listRunsAsCsv: get('/projects/:project/runs.csv', 'viewer', 'read'),
  listChoices: get('/projects/:project/choices', 'viewer', 'read'),
  showTrend: get('/projects/:project/trend', 'viewer', 'read'),
  pushRuns: post('/projects/:project/runs', 'engineer', 'push'),
  findMissingInputs: post('/projects/:project/inputs/missing', 'engineer', 'push'),
  putInput: route('PUT', '/projects/:project/inputs/:sha256', 'engineer', 'push'),
  upload: post('/projects/:project/uploads', 'engineer'),

  showRun: get('/projects/:project/runs/:run', 'viewer', 'read'),
  showInputs: get('/projects/:project/runs/:run/inputs', 'viewer', 'read'),
  downloadRecord: get('/projects/:project/runs/:run/record.json', 'viewer', 'read'),
  downloadParts: get('/projects/:project/runs/:run/parts.csv', 'viewer', 'read'),
  downloadUrdf: get('/projects/:project/runs/:run/inertial.urdf', 'viewer', 'read'),
  downloadDrawing: get('/projects/:project/runs/:run/three-view.svg', 'viewer', 'read'),
  compareRuns: get('/projects/:project/comparison', 'viewer', 'read'),

  addComment: post('/projects/:project/runs/:run/comments', 'engineer'),
  removeComment: route('DELETE', '/projects/:project/runs/:run/comments/:comment', 'engineer'),
  askForRelease: post('/projects/:project/runs/:run/release-requests', 'engineer'),
  markAsChecked: post('/projects/:project/runs/:run/checks', 'engineer'),
  releaseRun: post('/projects/:project/runs/:run/releases', 'approver'),
  withdrawRelease: post('/projects/:project/runs/:run/withdrawals', 'approver'),

  listAudit: get('/audit', 'administrator'),
  listDemoMail: get('/demo/mail', 'demo'),
} as const satisfies Record<string, Route>;

export type RouteName = keyof typeof ROUTES;

/** Everything under it is the API; the rest of the server's paths are the dashboard's. */
export const API_ROOT = '/api';

/**
 * The address of a route with its places filled in and encoded.
 *
 * @param places by the name after the colon
 * @param query left out where undefined or empty
 */
export function addressOf(
  name: RouteName,
  places: Readonly<Record<string, string>> = {},
  query: Readonly<Record<string, string | number | undefined>> = {},
): string {
  const path = ROUTES[name].path.replace(/:(\w+)/g, (_, key: string) =>
    encodeURIComponent(places[key] ?? ''),
  );
  const given = Object.entries(query).flatMap(([key, value]): [string, string][] =>
    value === undefined || value === '' ? [] : [[key, String(value)]],
  );
  return API_ROOT + path + (given.length > 0 ? `?${new URLSearchParams(given)}` : '');
}
