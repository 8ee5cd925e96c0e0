import { randomBytes } from 'node:crypto';
import { eq, sql } from 'drizzle-orm';
import request from 'supertest';
import { beforeAll, describe, expect, it } from 'vitest';
import { shareLinks } from '#server/db/schema/share-links.ts';
import { signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';
import { createWorld, type World } from '../support/world.ts';

const service = useTestService();
let author: SignedIn;
let checker: SignedIn;
let world: World;
beforeAll(async () => {
  author = await signedIn(service, 'engineer');
  checker = await signedIn(service, 'checker');
  world = await createWorld(service, author, [checker.person]);
});

const open = (token: string) => request(service.app).get(`/api/shared/${token}`);
const newLink = async () => (await author.post(`/projects/${world.project}/share-links`).expect(200)).body;

describe('a share link', () => {
  it('shows the shortlist to anybody, without signing in', async () => {
    const { token } = await newLink();
    const { body } = await open(token).expect(200);
    expect(body).toMatchObject({ projectName: 'Footbridge', units: 'si' });
    expect(body.candidates.map(({ id }: { id: string }) => id)).toEqual([world.candidate]);
    expect(body.candidates[0].snapshot.basis.rates).toBeNull();
    for (const key of ['comments', 'transitions', 'allowedTransitions']) {
      expect(body.candidates[0]).not.toHaveProperty(key);
    }
  });

  it('is shown again with the same token, which the database does not hold', async () => {
    const link = await newLink();
    const { body } = await author.get(`/projects/${world.project}/share-links`).expect(200);
    expect(body).toContainEqual(link);
    const [row] = await service.deps.db.select().from(shareLinks).where(eq(shareLinks.id, link.id));
    expect(JSON.stringify(row)).not.toContain(link.token);
  });

  it('opens nothing once it is revoked, and is listed no more', async () => {
    const { id, token } = await newLink();
    await author.delete(`/share-links/${id}`).expect(200);
    await author.delete(`/share-links/${id}`).expect(200);
    const { body } = await open(token).expect(404);
    expect(body.error.code).toBe('not-found');
    const listed = await author.get(`/projects/${world.project}/share-links`).expect(200);
    expect(listed.body.map((link: { id: string }) => link.id)).not.toContain(id);
  });

  it('closes by itself after its time', async () => {
    const { id, token, createdAt, expiresAt } = await newLink();
    expect(Date.parse(expiresAt) - Date.parse(createdAt)).toBe(30 * 24 * 3600 * 1000);
    await service.deps.db
      .update(shareLinks)
      .set({ createdAt: sql`now() - interval '31 days'`, expiresAt: sql`now() - interval '1 second'` })
      .where(eq(shareLinks.id, id));
    await open(token).expect(404);
  });

  it('cannot be made up from an id, nor bent to another', async () => {
    const { id, token } = await newLink();
    const bytes = Buffer.from(token, 'base64url');
    const forged = Buffer.concat([Buffer.from(id.replaceAll('-', ''), 'hex'), randomBytes(16)]);
    const bent = Buffer.from(bytes);
    bent[3]! ^= 1;
    for (const attempt of [
      forged,
      bent,
      randomBytes(32),
      bytes.subarray(0, 31),
      Buffer.concat([bytes, bytes]),
    ]) {
      await open(attempt.toString('base64url')).expect(404);
    }
    const other = service.buildWith({ sessionSecret: 'another secret, as long as the first one' });
    await request(other).get(`/api/shared/${token}`).expect(404);
  });

  it('leaves out what was returned to its author', async () => {
    const { token } = await newLink();
    const move = { to: 'returned', note: 'Too deep' };
    await checker.post(`/candidates/${world.candidate}/transitions`, move).expect(200);
    expect((await open(token).expect(200)).body.candidates).toEqual([]);
  });
});
