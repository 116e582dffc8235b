import type { Provenance } from '#core/record/record.ts';

type Environment = Readonly<Record<string, string | undefined>>;

/** What a CI system says of the job: its name, the run, a link, the merge request; and commit and branch. */
export interface CiState {
  readonly ci: NonNullable<Provenance['ci']>;
  readonly commit?: string;
  readonly branch?: string;
}

interface CiSystem {
  readonly name: string;
  readonly is: (env: Environment) => boolean;
  readonly read: (env: Environment) => {
    run?: string;
    url?: string;
    request?: string;
    commit?: string;
    branch?: string;
  };
}

/** Detected by the variables that each documents; the first that fits wins. */
const SYSTEMS: readonly CiSystem[] = [
  {
    name: 'GitHub Actions',
    is: (e) => e.GITHUB_ACTIONS === 'true',
    read: (e) => ({
      run: e.GITHUB_RUN_ID,
      url:
        e.GITHUB_SERVER_URL &&
        `${e.GITHUB_SERVER_URL}/${e.GITHUB_REPOSITORY}/actions/runs/${e.GITHUB_RUN_ID}`,
      request: /^refs\/pull\/(\d+)\//.exec(e.GITHUB_REF ?? '')?.[1],
      commit: e.GITHUB_SHA,
      branch: e.GITHUB_HEAD_REF || e.GITHUB_REF_NAME,
    }),
  },
  {
    name: 'GitLab CI',
    is: (e) => e.GITLAB_CI === 'true',
    read: (e) => ({
      run: e.CI_JOB_ID,
      url: e.CI_JOB_URL,
      request: e.CI_MERGE_REQUEST_IID,
      commit: e.CI_COMMIT_SHA,
      branch: e.CI_COMMIT_REF_NAME,
    }),
  },
  {
    name: 'Jenkins',
    is: (e) => e.JENKINS_URL !== undefined,
    read: (e) => ({
      run: e.BUILD_NUMBER,
      url: e.BUILD_URL,
      request: e.CHANGE_ID,
      commit: e.GIT_COMMIT,
      branch: e.GIT_BRANCH,
    }),
  },
  {
    name: 'Azure Pipelines',
    is: (e) => e.TF_BUILD === 'True',
    read: (e) => ({
      run: e.BUILD_BUILDID,
      request: e.SYSTEM_PULLREQUEST_PULLREQUESTNUMBER,
      commit: e.BUILD_SOURCEVERSION,
      branch: e.BUILD_SOURCEBRANCHNAME,
    }),
  },
  {
    name: 'CircleCI',
    is: (e) => e.CIRCLECI === 'true',
    read: (e) => ({
      run: e.CIRCLE_BUILD_NUM,
      url: e.CIRCLE_BUILD_URL,
      commit: e.CIRCLE_SHA1,
      branch: e.CIRCLE_BRANCH,
    }),
  },
  { name: 'CI', is: (e) => e.CI !== undefined && e.CI !== '' && e.CI !== 'false', read: () => ({}) },
];

export function ciState(env: Environment): CiState | null {
  const system = SYSTEMS.find((s) => s.is(env));
  if (!system) return null;
  const { commit, branch, ...rest } = system.read(env);
  const known = Object.fromEntries(Object.entries(rest).filter(([, v]) => v)) as Record<string, string>;
  return { ci: { name: system.name, ...known }, ...(commit && { commit }), ...(branch && { branch }) };
}
