// Bundles the command into dist/cli/: one entry and chunks that load only when a command needs them.
// Run by `npm run build`, by `npm ci` through `prepare`, and by the first `npm start`.
import { chmodSync, mkdirSync, mkdtempSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');

const SHAPE = 'core/document/assembly-shape.ts';

/**
 * Puts the table that a module computes from the schema in that module's place, so that reading a right file loads
 * neither the schema nor its library.
 */
async function shapePlugin(bundle) {
  const { outputFiles } = await bundle({
    absWorkingDir: root,
    entryPoints: [SHAPE],
    bundle: true,
    write: false,
    format: 'esm',
    platform: 'node',
  });
  const text = Buffer.from(outputFiles[0].contents).toString('base64');
  const { assemblyShape } = await import(`data:text/javascript;base64,${text}`);
  const contents = `export const assemblyShape = ${JSON.stringify(assemblyShape)};`;
  return {
    name: 'shape',
    setup: ({ onLoad }) => onLoad({ filter: /[\\/]assembly-shape\.ts$/ }, () => ({ contents, loader: 'js' })),
  };
}

export async function build() {
  const { build: bundle } = await import('esbuild');
  const plugins = [await shapePlugin(bundle)];
  const { version } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));
  // Beside its place, and moved there when whole: a failed build leaves the command as it was.
  const outdir = mkdtempSync(join(root, '.dist-'));
  const dist = join(root, 'dist', 'cli');
  mkdirSync(join(root, 'dist'), { recursive: true });
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
    plugins,
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
