import { randomUUID } from 'node:crypto';
import type { PriceBook, ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import type { OfficeStandardInput } from '#shared/contract/office-standard.ts';
import type { BeamInput, EvaluateInput, Person, Role } from '#shared/contract/records.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { beams } from '#server/db/schema/beams.ts';
import { people } from '#server/db/schema/people.ts';
import { projectMembers } from '#server/db/schema/project-members.ts';
import { projects } from '#server/db/schema/projects.ts';
import { sweeps } from '#server/db/schema/sweeps.ts';
import type { Deps } from '#server/deps.ts';

export const PASSWORD = 'a password of the tests';

/** bcrypt at its least cost of PASSWORD, once per test file. */
let passwordHash: Promise<string> | undefined;

export async function createPerson(
  { db, passwords }: Deps,
  values: { role: Role; email?: string; name?: string },
): Promise<Person> {
  passwordHash ??= passwords.hash(PASSWORD);
  const [created] = await db
    .insert(people)
    .values({
      name: `The ${values.role}`,
      email: `${randomUUID()}@office.example`,
      ...values,
      passwordHash: await passwordHash,
    })
    .returning();
  const { id, name, email, role } = created!;
  return { id, name, email, role };
}

export const designBasis: ProjectDesignBasis = {
  ruleSet: 'aci318m-19',
  barStandard: 'iso',
  esMPa: 200_000,
  maxAggregateMm: 19,
  bendAllowance: 'corner-in-bend',
  displacedConcrete: 'deduct',
  yieldCurvatureAt: 'outermost-layer',
  slabMm: 0,
  units: 'si',
  fyMPa: 420,
  fytMPa: 420,
  coverMm: 40,
};

export const officeStandard: OfficeStandardInput = {
  name: 'Metric, EN bars',
  units: 'si',
  barStandard: 'iso',
  bars: {
    tension: ['16', '20', '25'],
    compression: ['16', '20'],
    stirrups: [{ bar: '10', legs: 2, spacingMm: 150 }],
  },
  mixesMPa: [25, 30],
  increments: { widthMm: 50, depthMm: 50 },
  rules: {
    minDepthToWidth: 1,
    maxDepthToWidth: 3,
    maxLayers: 2,
    oneSizePerFace: true,
    minCompressionShare: null,
    requireHangers: true,
  },
  ranges: [
    {
      name: 'Floor beams',
      leastWidthMm: 250,
      mostWidthMm: 450,
      leastDepthMm: 400,
      mostDepthMm: 800,
      tensionCounts: [2, 3, 4, 5, 6],
      compressionCounts: [2, 3],
    },
  ],
};

export const priceBook: PriceBook = {
  currency: 'EUR',
  steelPerKg: 1.4,
  stirrupPerKg: 1.7,
  formworkPerM2: 48,
  concrete: [{ fcMPa: 30, costPerM3: 135, co2eKgPerM3: 290 }],
  steelCo2ePerKg: 0.85,
  lapShare: 0.08,
  wasteShare: 0.03,
  source: 'Invented for the tests',
};

export async function createProject(
  { db }: Deps,
  { members, ...values }: { members: Person[]; number?: string; priceBook?: PriceBook | null },
): Promise<{ id: string }> {
  const [created] = await db
    .insert(projects)
    .values({
      name: 'Footbridge',
      number: randomUUID(),
      designBasis,
      priceBook,
      createdBy: members[0]!.id,
      ...values,
    })
    .returning({ id: projects.id });
  const projectId = created!.id;
  await db.insert(projectMembers).values(members.map(({ id }) => ({ projectId, personId: id })));
  return created!;
}

export const beamInput: BeamInput = {
  mark: 'B1',
  location: 'Level 2',
  spanMm: 7200,
  count: 6,
  muNmm: 300e6,
  vuN: 180e3,
  ductilityTarget: 6,
  depthCapMm: 700,
};

export async function createBeam(
  { db }: Deps,
  projectId: string,
  mark: string = randomUUID(),
): Promise<{ id: string }> {
  const [created] = await db
    .insert(beams)
    .values({ ...beamInput, projectId, mark })
    .returning({ id: beams.id });
  return created!;
}

/** 3 widths × 5 depths × 2 sizes × 3 counts = 90 sections. */
export const sweepDefinition: SweepDefinition = {
  space: {
    width: { kind: 'range', from: 300, to: 400, step: 50 },
    depth: { kind: 'range', from: 500, to: 700, step: 50 },
    fc: { kind: 'list', values: [30] },
    fy: { kind: 'list', values: [420] },
    cover: { kind: 'list', values: [40] },
    stirrups: [{ bar: '10', legs: 2, spacingMm: 200 }],
    tension: { kind: 'bars', sizes: ['20', '25'], counts: [3, 4, 5], none: false },
    compression: { kind: 'bars', sizes: [], counts: [], none: true },
  },
  demand: { muNmm: 300e6, ductilityTarget: 6, depthCapMm: 700 },
  rules: {
    minDepthToWidth: null,
    maxDepthToWidth: null,
    maxLayers: 2,
    oneSizePerFace: true,
    excludedBars: [],
    columnWidthMm: null,
    minCompressionShare: null,
    requireHangers: false,
  },
  view: { x: 'steelKgPerM', y: 'depthMm' },
};

export async function createSweep(
  { db }: Deps,
  at: { beamId: string; creator: Person },
): Promise<{ id: string }> {
  const [created] = await db
    .insert(sweeps)
    .values({ beamId: at.beamId, createdBy: at.creator.id, name: 'First', definition: sweepDefinition })
    .returning({ id: sweeps.id });
  return created!;
}

/** 350 × 600, 4 bars of 25 in one layer. */
export const evaluateInput: EvaluateInput = {
  section: {
    widthMm: 350,
    depthMm: 600,
    fcMPa: 30,
    fyMPa: 420,
    coverMm: 40,
    stirrup: { bar: '10', legs: 2, spacingMm: 200 },
    reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 4 }], compression: [] },
  },
  demand: sweepDefinition.demand,
  rules: sweepDefinition.rules,
  basis: {},
};
