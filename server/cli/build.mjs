import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { withExclusive } from './exclusive.mjs';
import { PROJECT_ROOT } from './project-paths.mjs';
import { requireProgram } from './run-program.mjs';

const OUTPUT = path.join(PROJECT_ROOT, 'dist');
const UNFINISHED = path.join(PROJECT_ROOT, 'dist.unfinished');
const FINGERPRINT = '.source-fingerprint';
const SOURCES = ['shared', 'server', 'client', 'vite.config.ts', 'package.json', 'package-lock.json'];

/** Builds client and server into dist, unless dist was built from exactly these sources. */
export async function ensureBuilt() {
  await withExclusive(OUTPUT, async () => {
    const fingerprint = digestSources();
    const stamp = path.join(OUTPUT, FINGERPRINT);
    if (fs.existsSync(stamp) && fs.readFileSync(stamp, 'utf8') === fingerprint) return;
    // Beside dist and renamed when complete: a build cut short, or one that fails, leaves the last good one.
    fs.rmSync(UNFINISHED, { recursive: true, force: true });
    await Promise.all([buildClient(), buildServer(path.join(UNFINISHED, 'server'))]);
    fs.writeFileSync(path.join(UNFINISHED, FINGERPRINT), fingerprint);
    fs.rmSync(OUTPUT, { recursive: true, force: true });
    fs.renameSync(UNFINISHED, OUTPUT);
  });
}

async function buildClient() {
  const vite = path.join(PROJECT_ROOT, 'node_modules', 'vite', 'bin', 'vite.js');
  const options = ['--outDir', path.join(UNFINISHED, 'client'), '--logLevel', 'warn'];
  // Whoever asks for the build, also a test: with any other NODE_ENV Vite would bundle React's development version.
  const environment = { NODE_ENV: 'production' };
  await requireProgram(process.execPath, [vite, 'build', ...options], {
    cwd: PROJECT_ROOT,
    isQuiet: true,
    environment,
  });
}

/**
 * One file per entry, packages left in node_modules. Threads load plain JavaScript and need no TypeScript loader.
 *
 * @param {string} outputFolder inside the project, so that packages are found
 */
export async function buildServer(outputFolder) {
  const { build, stop } = await import('esbuild');
  const computeFolder = path.join(PROJECT_ROOT, 'server', 'compute');
  const workers = fs.readdirSync(computeFolder).filter((file) => file.endsWith('worker.ts'));
  await build({
    absWorkingDir: PROJECT_ROOT,
    entryPoints: {
      main: 'server/main.ts',
      worker: 'server/worker.ts',
      migrate: 'server/cli/migrate.ts',
      seed: 'server/cli/seed.ts',
      ...Object.fromEntries(
        workers.map((file) => [`workers/${path.basename(file, '.ts')}`, `server/compute/${file}`]),
      ),
    },
    outdir: outputFolder,
    bundle: true,
    packages: 'external',
    platform: 'node',
    format: 'esm',
    target: 'node20',
    sourcemap: true,
    logLevel: 'warning',
  });
  // Its own process would otherwise stay beside the service for as long as that runs.
  await stop();
}

function digestSources() {
  const hash = createHash('sha256');
  for (const file of SOURCES.flatMap((source) => listFiles(path.join(PROJECT_ROOT, source)))) {
    hash.update(path.relative(PROJECT_ROOT, file)).update('\0').update(fs.readFileSync(file)).update('\0');
  }
  return hash.digest('hex');
}

/**
 * @param {string} entry
 * @returns {string[]}
 */
function listFiles(entry) {
  if (!fs.statSync(entry).isDirectory()) return [entry];
  const names = fs.readdirSync(entry).sort();
  return names.flatMap((name) => listFiles(path.join(entry, name)));
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) await ensureBuilt();
