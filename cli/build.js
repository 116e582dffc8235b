// Bundles the command into dist/: one entry and chunks that load only when a command needs them.
// Run by `npm run build`, by `npm ci` through `prepare`, and by the first `npm start`.
import { chmodSync, mkdtempSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');

export async function build() {
  const { build: bundle } = await import('esbuild');
  const { version } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));
  // Beside its place, and moved there when whole: a failed build leaves the command as it was.
  const outdir = mkdtempSync(join(root, '.dist-'));
  const dist = join(root, 'dist');
  await bundle({
    absWorkingDir: root,
    entryPoints: { steelyard: 'cli/main.ts' },
    outdir,
    bundle: true,
    splitting: true,
    minify: true,
    platform: 'node',
    format: 'esm',
    target: 'node20.19',
    chunkNames: 'chunks/[name]-[hash]',
    define: { STEELYARD_VERSION: JSON.stringify(version) },
    banner: {
      js: "#!/usr/bin/env node\nimport{createRequire as __createRequire}from'node:module';const require=__createRequire(import.meta.url);",
    },
    logLevel: 'warning',
  }).catch((error) => {
    rmSync(outdir, { recursive: true, force: true });
    throw error;
  });
  chmodSync(outdir, 0o755);
  rmSync(dist, { recursive: true, force: true });
  renameSync(outdir, dist);
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  try {
    await build();
  } catch (error) {
    // An installation without development packages has no bundler; the packed product brings dist/ with it.
    if (error?.code !== 'ERR_MODULE_NOT_FOUND') throw error;
    console.error(
      'steelyard: the bundler is not installed, so dist/ was not built; run npm ci with development packages',
    );
  }
}
