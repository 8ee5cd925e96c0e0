import { beforeAll, describe, expect, it } from 'vitest';
import type { OfficeStandard } from '#shared/contract/office-standard.ts';
import { officeStandard } from '../support/factories.ts';
import { signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';

const service = useTestService();
let admin: SignedIn;
let engineer: SignedIn;
beforeAll(async () => {
  admin = await signedIn(service, 'admin');
  engineer = await signedIn(service, 'engineer');
});

const listed = async (): Promise<OfficeStandard[]> =>
  (await engineer.get('/office-standards').expect(200)).body;

describe('a standard of the office', () => {
  it('is set by an admin and read by whoever designs, as it was entered', async () => {
    const { body } = await admin.post('/office-standards', officeStandard).expect(200);
    expect(body).toMatchObject({ ...officeStandard, updatedBy: { id: admin.person.id } });
    expect(await listed()).toEqual([body]);
    const changed = { ...officeStandard, mixesMPa: [30, 35, 40] };
    const second = await admin.put(`/office-standards/${body.id}`, changed).expect(200);
    expect(second.body.mixesMPa).toEqual([30, 35, 40]);
    await admin.delete(`/office-standards/${body.id}`).expect(200);
    expect(await listed()).toEqual([]);
  });

  it('has a name of its own', async () => {
    await admin.post('/office-standards', { ...officeStandard, name: 'Metric' }).expect(200);
    const { body } = await admin.post('/office-standards', { ...officeStandard, name: 'metric' }).expect(409);
    expect(body.error.issues).toEqual([
      { path: ['name'], message: 'Another standard of the office is named metric already' },
    ]);
  });

  it('names bars its standard lists, ranges that are some, and each kind of beam once', async () => {
    const [floor] = officeStandard.ranges;
    const { body } = await admin
      .post('/office-standards', {
        ...officeStandard,
        bars: { ...officeStandard.bars, tension: ['20', '#8'] },
        rules: { ...officeStandard.rules, minDepthToWidth: 4 },
        ranges: [floor, { ...floor, name: 'floor beams' }],
      })
      .expect(400);
    expect(body.error.issues).toEqual([
      { path: ['bars', 'tension', 1], message: 'The bar standard lists no bar #8' },
      { path: ['rules', 'maxDepthToWidth'], message: 'Largest h/b is below the least h/b' },
      { path: ['ranges', 1, 'name'], message: 'Another kind of beam has this name' },
    ]);
    const crossed = { ...officeStandard, ranges: [{ ...floor, mostDepthMm: 300 }] };
    const refused = await admin.post('/office-standards', crossed).expect(400);
    expect(refused.body.error.issues).toEqual([
      { path: ['ranges', 0, 'mostDepthMm'], message: 'The largest depth is below the least' },
    ]);
  });
});
