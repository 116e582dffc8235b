// Bundles the server into dist/server/ and the dashboard into dist/web/. Packages stay outside the bundle: Sequelize
// cannot be bundled, and the server runs where they are installed.
import {
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const built = join(root, 'dist', 'server', 'built');

const SERVER_SOURCES = ['core', 'server', 'migrations', 'package.json'];
const WEB_SOURCES = ['core', 'web', 'fonts', 'vite.config.ts', 'package.json'];

/** The time of the youngest file in some folders. */
function youngest(names) {
  let time = 0;
  const walk = (path) => {
    const stat = statSync(path);
    if (stat.isDirectory()) for (const name of readdirSync(path)) walk(join(path, name));
    else time = Math.max(time, stat.mtimeMs);
  };
  for (const name of names) walk(join(root, name));
  return time;
}

const isStale = (made, sources) => !existsSync(made) || statSync(made).mtimeMs < youngest(sources);

export async function buildServer() {
  const { build } = await import('esbuild');
  const { version, dependencies } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));
  const making = join(root, 'dist', '.server');
  rmSync(making, { recursive: true, force: true });
  mkdirSync(making, { recursive: true });
  await build({
    absWorkingDir: root,
    entryPoints: {
      main: 'server/main.ts',
      'start-local': 'server/start-local.ts',
      administrator: 'server/administrator.ts',
      backup: 'server/backup.ts',
      restore: 'server/restore.ts',
      thread: 'server/compute/thread.ts',
    },
    outdir: making,
    bundle: true,
    splitting: true,
    platform: 'node',
    format: 'esm',
    target: 'node20.19',
    sourcemap: true,
    chunkNames: 'chunks/[name]-[hash]',
    external: Object.keys(dependencies).flatMap((name) => [name, `${name}/*`]),
    define: { STEELYARD_VERSION: JSON.stringify(version) },
    logLevel: 'warning',
  });
  writeFileSync(join(making, 'built'), '');
  rmSync(join(root, 'dist', 'server'), { recursive: true, force: true });
  renameSync(making, join(root, 'dist', 'server'));
}

export async function buildWeb() {
  const { build } = await import('vite');
  const { NODE_ENV } = process.env;
  // What is built is for use, whatever the environment is for: React's own checks stay out.
  process.env.NODE_ENV = 'production';
  try {
    await build({ configFile: join(root, 'vite.config.ts'), logLevel: 'warn' });
  } finally {
    if (NODE_ENV === undefined) delete process.env.NODE_ENV;
    else process.env.NODE_ENV = NODE_ENV;
  }
}

export async function buildIfStale(tell) {
  if (isStale(built, SERVER_SOURCES)) {
    tell('building the server');
    await buildServer();
  }
  await buildWebIfStale(tell);
}

export async function buildWebIfStale(tell) {
  if (isStale(join(root, 'dist', 'web', 'index.html'), WEB_SOURCES)) {
    tell('building the dashboard');
    await buildWeb();
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await buildServer();
  await buildWeb();
}
