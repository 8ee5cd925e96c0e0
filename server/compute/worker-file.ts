import { createHash, randomUUID } from 'node:crypto';
import { mkdir, rename, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

/**
 * The plain JavaScript file a thread loads. The build puts it beside the server's bundle. In development and tests,
 * where this file runs as TypeScript, it is bundled now (10 to 50 ms), because a TypeScript loader inside a worker
 * thread breaks on the first package that is ESM only.
 */
export async function resolveWorkerFile(name: string): Promise<string> {
  if (!import.meta.url.endsWith('.ts')) return new URL(`./workers/${name}.js`, import.meta.url).href;
  const { build } = await import('esbuild');
  const result = await build({
    entryPoints: [fileURLToPath(new URL(`./${name}.ts`, import.meta.url))],
    bundle: true,
    packages: 'external',
    platform: 'node',
    format: 'esm',
    target: 'node20',
    sourcemap: 'inline',
    write: false,
  });
  const code = result.outputFiles[0]!.contents;
  const digest = createHash('sha256').update(code).digest('hex').slice(0, 12);
  // Inside the project, so that the worker's bare imports resolve.
  const folder = fileURLToPath(new URL('../../node_modules/.cache/workers', import.meta.url));
  const file = path.join(folder, `${name}.${digest}.mjs`);
  await mkdir(folder, { recursive: true });
  // Renamed when complete: parallel test files bundle the same worker.
  const unfinished = `${file}.${randomUUID()}`;
  await writeFile(unfinished, code);
  await rename(unfinished, file);
  return pathToFileURL(file).href;
}
