import { afterAll, beforeAll, expect, test } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { DesignBasis, SectionInput } from '#shared/engine/section.ts';
import {
  addProject,
  DESIGN_BASIS,
  PRICE_BOOK,
  SMALL_SWEEP,
  type OfficeProject,
} from '../support/office-project.ts';
import type { TestOffice } from '../support/office.ts';
import { openTestOffice } from '../support/test-office.ts';

let office: TestOffice;
let project: OfficeProject;

beforeAll(async () => {
  office = await openTestOffice();
  project = await addProject(office);
});
afterAll(() => office.close());

const { demand, rules } = SMALL_SWEEP;
const SECTION: SectionInput = {
  widthMm: 300,
  depthMm: 600,
  fcMPa: 28,
  fyMPa: 420,
  coverMm: 40,
  stirrup: null,
  reinforcement: {
    kind: 'layers',
    layers: [
      { depthMm: 60, areaMm2: 600, face: 'compression' },
      { depthMm: 540, areaMm2: 2000, face: 'tension' },
    ],
  },
};

async function evaluate(body: object) {
  const engineer = await office.as('engineer');
  return engineer.post(`/projects/${project.projectId}/evaluations`, {
    section: SECTION,
    demand,
    rules,
    basis: {},
    ...body,
  });
}

test('a typed section is judged on the project’s basis and rates', async () => {
  const { source: _source, ...rates } = PRICE_BOOK;
  const { units: _units, fyMPa: _fy, coverMm: _cover, ...engineBasis } = DESIGN_BASIS;
  const basis: DesignBasis = { ...engineBasis, rates };
  const answer = await evaluate({});
  expect(answer.status).toBe(200);
  const expected = evaluateSection(SECTION, { basis, demand, rules });
  expect(answer.body).toEqual(JSON.parse(JSON.stringify({ section: SECTION, evaluation: expected })));
  expect(expected.quantities.cost!.total).toBeGreaterThan(0);
});

test('one evaluation may use other conventions than the project', async () => {
  const answer = await evaluate({ basis: { ruleSet: 'aci318-14', displacedConcrete: 'ignore' } });
  expect(answer.body.evaluation).toMatchObject({
    ruleSet: { id: 'aci318-14' },
    conventions: { displacedConcrete: 'ignore', yieldCurvatureAt: DESIGN_BASIS.yieldCurvatureAt },
  });
});

test('what is no section is refused at its field', async () => {
  const layer = { depthMm: 700, areaMm2: 500, face: 'tension' };
  const outside = await evaluate({
    section: { ...SECTION, reinforcement: { kind: 'layers', layers: [layer] } },
  });
  expect(outside.status).toBe(400);
  expect(outside.body.error.issues[0].path).toEqual(['section', 'reinforcement', 'layers', 0, 'depthMm']);
  const bars = { kind: 'bars', tension: [{ bar: '25M', count: 3 }], compression: [] };
  const unknown = await evaluate({ section: { ...SECTION, reinforcement: bars } });
  expect(unknown.status).toBe(400);
  expect(unknown.body.error.issues[0].path.slice(0, 3)).toEqual(['section', 'reinforcement', 'tension']);
  expect(unknown.body.error.issues[0].message).toContain('25M');
  for (const widthMm of [-300, null, '300', 1e9])
    expect((await evaluate({ section: { ...SECTION, widthMm } })).body.error.issues[0].path).toEqual([
      'section',
      'widthMm',
    ]);
});

test('a layer has steel to speak of or none, so that every number of the answer is one', async () => {
  const withLayers = (...areasMm2: number[]) => {
    const layers = areasMm2.map((areaMm2, i) => ({ depthMm: 300 + i, areaMm2, face: 'tension' }));
    return evaluate({ section: { ...SECTION, reinforcement: { kind: 'layers', layers } } });
  };
  const trace = await withLayers(500, 5e-324);
  expect(trace.body.error.issues).toEqual([
    {
      path: ['section', 'reinforcement', 'layers', 1, 'areaMm2'],
      message: 'Layer area must be 0, or at least 1 mm²',
    },
  ]);
  const least = await withLayers(1, 0);
  expect(least.status).toBe(200);
  const { curvatureDuctility } = least.body.evaluation.measures;
  expect(curvatureDuctility).toBeGreaterThan(0);
});

test('nobody evaluates on a project that is not theirs', async () => {
  const outsider = await office.as('outsider');
  const body = { section: SECTION, demand, rules, basis: {} };
  await outsider.post(`/projects/${project.projectId}/evaluations`, body).expect(404);
});

test('a T section is judged with its slab, and a slab that does not go with its web is refused by its field', async () => {
  const flange = {
    shape: 't',
    thicknessMm: 120,
    face: 'compression',
    width: { kind: 'effective', clearToNextWebMm: 2400, spanMm: 8000 },
  } as const;
  const answer = await evaluate({ section: { ...SECTION, flange } });
  expect(answer.status).toBe(200);
  expect(answer.body).toMatchObject({
    evaluation: { flange: { shape: 't', widthMm: 300 + 2 * 960, thicknessMm: 120, face: 'compression' } },
  });
  const refused = async (change: object) => {
    const { status, body } = await evaluate({ section: { ...SECTION, flange: { ...flange, ...change } } });
    expect(status).toBe(400);
    return JSON.stringify(body);
  };
  expect(await refused({ thicknessMm: 600 })).toContain('The flange must be thinner than the depth h');
  expect(await refused({ width: { kind: 'given', widthMm: 299 } })).toContain('as wide as the web, or wider');
  expect(await refused({ shape: 'x' })).toContain('Choose a T or an L');
});
