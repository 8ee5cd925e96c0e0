import fs from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import { PROJECT_ROOT } from './project-paths.mjs';

/** What a first visit must load before anything can be shown; the chart library comes later, on its own. */
export const INITIAL_SCRIPT_LIMIT_KB = 200;

/**
 * Gzipped kilobytes (1000 bytes) of the entry script and all that it imports statically.
 *
 * @returns {number}
 */
export function measureInitialScriptKb() {
  const client = path.join(PROJECT_ROOT, 'dist', 'client');
  /** @type {Record<string, { file: string, isEntry?: boolean, imports?: string[] }>} */
  const manifest = JSON.parse(fs.readFileSync(path.join(client, '.vite', 'manifest.json'), 'utf8'));
  const keys = new Set(Object.keys(manifest).filter((key) => manifest[key]?.isEntry));
  for (const key of keys) for (const imported of manifest[key]?.imports ?? []) keys.add(imported);
  const scripts = [...keys]
    .flatMap((key) => manifest[key]?.file ?? [])
    .filter((file) => file.endsWith('.js'));
  const sizes = scripts.map((file) => gzipSync(fs.readFileSync(path.join(client, file))).length);
  if (sizes.length === 0) throw new Error('The build names no entry script');
  return sizes.reduce((sum, size) => sum + size, 0) / 1000;
}
