import { randomBytes } from 'node:crypto';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Express } from 'express';
import pg from 'pg';
import { pino } from 'pino';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { endpoints, RUN_EVENTS_PATH, SHEET_PDF_PATH } from '#shared/contract/endpoints.ts';
import { SECTIONS_FILE_PATH, TAKEOFF_FILE_PATH } from '#shared/contract/endpoints/file-endpoints.ts';
import { buildApp } from '#server/app.ts';
import { readConfig } from '#server/config.ts';
import { createDatabase } from '#server/db/client.ts';
import { createSessionStore } from '#server/http/session-store.ts';
import { useTestService } from '../support/test-service.ts';

const service = useTestService();

describe('the API', () => {
  it('describes every endpoint as OpenAPI', async () => {
    const { body } = await request(service.app).get('/api/openapi.json').expect(200);
    const described = Object.entries<Record<string, { operationId: string }>>(body.paths).flatMap(
      ([at, methods]) =>
        Object.entries(methods).map(([method, { operationId }]) => `${operationId} ${method} ${at}`),
    );
    const expected = Object.entries({
      ...endpoints,
      runEvents: { method: 'get', path: RUN_EVENTS_PATH },
      sheetPdf: { method: 'get', path: SHEET_PDF_PATH },
      sectionsFile: { method: 'get', path: SECTIONS_FILE_PATH },
      takeoffFile: { method: 'get', path: TAKEOFF_FILE_PATH },
    }).map(([name, { method, path: at }]) => `${name} ${method} ${at.replace(/:(\w+)/g, '{$1}')}`);
    expect(described.sort()).toEqual(expected.sort());
    const signIn = body.paths['/session'].post.requestBody.content['application/json'].schema;
    expect(Object.keys(signIn.properties)).toEqual(['email', 'password']);
  });

  it('answers an address it does not have as JSON, also where a page could be meant', async () => {
    const { status, body } = await request(service.app).get('/api/nothing/here');
    expect([status, body.error.code]).toEqual([404, 'not-found']);
  });

  it('gives each answer its request id, in the header and in the refusal', async () => {
    const first = await request(service.app).get('/api/projects').expect(401);
    const second = await request(service.app).get('/api/projects').expect(401);
    expect(first.body.error.requestId).toBe(first.headers['x-request-id']);
    expect(second.body.error.requestId).not.toBe(first.body.error.requestId);
  });

  it('keeps share links out of the log, however they are written', async () => {
    const lines: string[] = [];
    const log = pino({ level: 'debug' }, { write: (line) => void lines.push(line) });
    const app = buildApp({ ...service.deps, log });
    const token = randomBytes(32).toString('base64url');
    for (const at of [`/api/shared/${token}`, `/api/SHARED/${token}/`, `/shared/${token}?a=1`]) {
      await request(app).get(at);
    }
    await expect.poll(() => lines.length).toBe(3);
    expect(lines.join('')).toMatch(/shared\/…/i);
    expect(lines.join('')).not.toContain(token);
  });

  it('is never kept by a cache', async () => {
    const { headers } = await request(service.app).get('/api/session').expect(200);
    expect(headers['cache-control']).toBe('no-store');
  });

  it('compresses what is worth it', async () => {
    const { headers } = await request(service.app).get('/api/openapi.json').set('accept-encoding', 'gzip');
    expect(headers['content-encoding']).toBe('gzip');
  });

  it('says that it is well, and goes on after the database cut every connection', async () => {
    const isHealthy = () => request(service.app).get('/api/health');
    await isHealthy().expect(200, { isHealthy: true });
    const { pool } = service.deps;
    const cut =
      'select pg_terminate_backend(pid) from pg_stat_activity where pid <> pg_backend_pid() and datname = current_database()';
    await Promise.all([pool.query('select 1'), pool.query('select 1'), pool.query('select 1')]);
    await pool.query(cut);
    await expect.poll(async () => (await isHealthy()).status).toBe(200);
    await request(service.app).get('/api/session').expect(200);
  });

  it('answers 503 and not 500 while the database is away', async () => {
    const away = new pg.Pool({ connectionString: 'postgres://nobody@127.0.0.1:9/nothing' });
    const { log } = service.deps;
    const sessionStore = createSessionStore(away, log);
    const app = buildApp({ ...service.deps, pool: away, db: createDatabase(away), sessionStore });
    const signed = `fairweight.sid=s:${'a'.repeat(32)}.x`;
    for (const at of ['/api/health', '/api/session']) {
      const { status, body } = await request(app).get(at).set('cookie', signed);
      expect([status, body.error.code], at).toEqual([503, 'internal']);
    }
    sessionStore.close();
    await away.end();
  });
});

describe('the headers', () => {
  it('let the page run its own scripts only, and ask for no HTTPS on loopback', async () => {
    const { headers } = await request(service.app).get('/api/session');
    const policy = String(headers['content-security-policy']);
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("script-src 'self';");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toContain('upgrade-insecure-requests');
    expect(headers['strict-transport-security']).toBeUndefined();
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
  });
});

describe('the built client', () => {
  let root: string;
  let app: Express;
  beforeAll(async () => {
    root = await mkdtemp(path.join(tmpdir(), 'fairweight-client-'));
    await mkdir(path.join(root, 'dist/client/assets'), { recursive: true });
    await writeFile(path.join(root, 'dist/client/index.html'), '<!doctype html><title>Page</title>');
    await writeFile(path.join(root, 'dist/client/assets/app-1a2b.js'), 'export {};');
    app = service.buildWith({ appRoot: root });
  });
  afterAll(() => rm(root, { recursive: true }));
  const get = (at: string) => request(app).get(at);

  it('is one page for every address of the client, asked for each time', async () => {
    for (const at of ['/', '/projects/1', '/shared/abc']) {
      const { status, text, headers } = await get(at);
      expect([status, headers['cache-control']]).toEqual([200, 'no-cache']);
      expect(text).toContain('<title>Page</title>');
    }
  });

  it('has assets that are kept for ever, and a missing one is not answered with the page', async () => {
    const { headers } = await get('/assets/app-1a2b.js').expect(200);
    expect(headers['cache-control']).toBe('public, max-age=31536000, immutable');
    await get('/assets/app-0000.js').expect(404);
    await get('/assets/none').expect(404);
    await get('/favicon.ico').expect(404);
  });

  it('gives away nothing outside its folder', async () => {
    await writeFile(path.join(root, 'secret.txt'), 'secret');
    for (const at of ['/../../secret.txt', '/..%2f..%2fsecret.txt', '/assets/..%2f..%2f..%2fsecret.txt']) {
      expect((await get(at)).text).not.toContain('secret');
    }
  });
});

describe('the environment', () => {
  it('is refused with every problem named', () => {
    const read = () => readConfig({ SESSION_SECRET: 'short', PORT: '70000', NODE_ENV: 'test' });
    expect(read).toThrow(/DATABASE_URL names no database[^]*SESSION_SECRET is shorter[^]*PORT/);
  });

  it('costs a guesser a quarter of a second in production', () => {
    const values = { DATABASE_URL: 'postgres://x', SESSION_SECRET: 's'.repeat(32) };
    expect(readConfig({ ...values, NODE_ENV: 'production' }).passwordCost).toBe(12);
  });
});
