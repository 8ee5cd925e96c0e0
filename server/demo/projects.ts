import type { PriceBook, ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import type { BeamInput } from '#shared/contract/records.ts';
import {
  MM_PER_FT,
  MM_PER_IN,
  MPA_PER_KSI,
  MPA_PER_PSI,
  NMM_PER_KIPFT,
  NMM_PER_KNM,
  N_PER_KIP,
} from '#shared/engine/units.ts';

const N_PER_KN = 1000;

/** The invented practice's work: every name, place, load and rate here is made up. */
export interface DemoProject {
  readonly key: string;
  readonly name: string;
  readonly number: string;
  /** Days after the demo's first day. */
  readonly day: number;
  readonly designBasis: ProjectDesignBasis;
  readonly priceBook: PriceBook | null;
  /** Without members only an admin reaches it. */
  readonly hasMembers: boolean;
  readonly beams: readonly BeamInput[];
}

const US_BASIS: ProjectDesignBasis = {
  units: 'us',
  ruleSet: 'aci318-19',
  barStandard: 'astm',
  esMPa: 29_000 * MPA_PER_KSI,
  maxAggregateMm: 0.75 * MM_PER_IN,
  bendAllowance: 'corner-in-bend',
  displacedConcrete: 'deduct',
  yieldCurvatureAt: 'outermost-layer',
  slabMm: 5 * MM_PER_IN,
  fyMPa: 60 * MPA_PER_KSI,
  fytMPa: 60 * MPA_PER_KSI,
  coverMm: 1.5 * MM_PER_IN,
};

const SI_BASIS: ProjectDesignBasis = {
  ...US_BASIS,
  units: 'si',
  ruleSet: 'aci318m-19',
  barStandard: 'iso',
  esMPa: 200_000,
  maxAggregateMm: 20,
  slabMm: 150,
  fyMPa: 420,
  fytMPa: 420,
  coverMm: 40,
};

/** Frames of ductility class M by the Eurocodes, with the values they recommend. */
const EN_BASIS: ProjectDesignBasis = {
  ...SI_BASIS,
  ruleSet: 'en1992',
  slabMm: 160,
  fyMPa: 500,
  fytMPa: 500,
  coverMm: 35,
  seismicSystem: 'dcm',
};

const US_RATES: PriceBook = {
  source: 'Invented rates for the demonstration, not a quotation',
  currency: 'USD',
  steelPerKg: 2.6,
  stirrupPerKg: 3.1,
  formworkPerM2: 118,
  concrete: [
    { fcMPa: 4000 * MPA_PER_PSI, costPerM3: 196, co2eKgPerM3: 285 },
    { fcMPa: 5000 * MPA_PER_PSI, costPerM3: 209, co2eKgPerM3: 325 },
    { fcMPa: 6000 * MPA_PER_PSI, costPerM3: 224, co2eKgPerM3: 365 },
    { fcMPa: 7000 * MPA_PER_PSI, costPerM3: 242, co2eKgPerM3: 400 },
  ],
  steelCo2ePerKg: 0.85,
  lapShare: 0.08,
  wasteShare: 0.03,
};

const SI_RATES: PriceBook = {
  ...US_RATES,
  currency: 'EUR',
  steelPerKg: 1.75,
  stirrupPerKg: 2.1,
  formworkPerM2: 62,
  concrete: [
    { fcMPa: 25, costPerM3: 128, co2eKgPerM3: 240 },
    { fcMPa: 30, costPerM3: 136, co2eKgPerM3: 265 },
    { fcMPa: 35, costPerM3: 145, co2eKgPerM3: 295 },
  ],
};

type BeamRow = readonly [
  mark: string,
  location: string,
  span: number,
  count: number,
  mu: number,
  vu: number,
  ductility: number | null,
  depthCap: number | null,
];

/** Spans ft, Mu kip·ft, Vu kip, depth caps in. */
const usBeam = ([mark, location, span, count, mu, vu, ductilityTarget, cap]: BeamRow): BeamInput => ({
  mark,
  location,
  spanMm: span * MM_PER_FT,
  count,
  muNmm: mu * NMM_PER_KIPFT,
  vuN: vu * N_PER_KIP,
  ductilityTarget,
  depthCapMm: cap === null ? null : cap * MM_PER_IN,
});

/** Spans m, Mu kN·m, Vu kN, depth caps mm. */
const siBeam = ([mark, location, span, count, mu, vu, ductilityTarget, depthCapMm]: BeamRow): BeamInput => ({
  mark,
  location,
  spanMm: span * 1000,
  count,
  muNmm: mu * NMM_PER_KNM,
  vuN: vu * N_PER_KN,
  ductilityTarget,
  depthCapMm,
});

const LIBRARY_BEAMS: readonly BeamRow[] = [
  ['B1', 'Level 2 reading room, grid C, 2 to 5', 28, 6, 225, 48, 6, 24],
  ['B2', 'Level 1 stacks, grids B and D', 24, 8, 310, 62, 6, 26],
  ['B3', 'Entrance hall, over the opening', 32, 2, 780, 104, 6, 30],
  ['B4', 'Roof, grids 2 to 6', 30, 10, 165, 24, 4, 22],
  ['B5', 'Stair landings', 14, 4, 48, 16, null, 16],
  ['B6', 'Gallery edge, level 2', 18, 3, 140, 40, 8, null],
  ['B7', 'Plant room floor', 26, 4, 420, 78, 5, 30],
  ['B8', 'Children’s library, level 1', 22, 6, 190, 38, 6, 20],
  ['B9', 'Loading bay', 20, 2, 360, 90, 8, null],
];

const CLINIC_BEAMS: readonly BeamRow[] = [
  ['G1', 'Level 1, grids A to D', 8.4, 12, 420, 210, 5, 700],
  ['G2', 'Level 2 wards', 6, 18, 180, 110, 5, 500],
  ['G3', 'Imaging suite', 10, 4, 640, 260, 6, null],
];

/** μφ of a frame with q₀ 3.9 and a period above TC: 2 q₀ − 1 (EN 1998-1 5.2.3.4; memory). */
const EN_DUCTILITY = 6.8;

const ARCADE_BEAMS: readonly BeamRow[] = [
  ['P1', 'Levels 1 to 3, at the columns of grids 2 to 5', 6.4, 24, 240, 165, EN_DUCTILITY, 600],
  ['P2', 'Levels 1 to 3, middle of the bays', 6.4, 24, 150, 70, null, 600],
  ['P3', 'Over the arcade', 8, 4, 380, 230, EN_DUCTILITY, null],
];

export const DEMO_PROJECTS: readonly DemoProject[] = [
  {
    key: 'library',
    name: 'Tidemill Library',
    number: 'TP-1042',
    day: 0,
    designBasis: US_BASIS,
    priceBook: US_RATES,
    hasMembers: true,
    beams: LIBRARY_BEAMS.map(usBeam),
  },
  {
    key: 'clinic',
    name: 'Wharf Lane Clinic',
    number: 'TP-1057',
    day: 9,
    designBasis: SI_BASIS,
    priceBook: SI_RATES,
    hasMembers: true,
    beams: CLINIC_BEAMS.map(siBeam),
  },
  {
    key: 'arcade',
    name: 'Saltmarket Arcade',
    number: 'TP-1060',
    day: 12,
    designBasis: EN_BASIS,
    priceBook: SI_RATES,
    hasMembers: true,
    beams: ARCADE_BEAMS.map(siBeam),
  },
  {
    key: 'depot',
    name: 'Gorse Hill Depot',
    number: 'TP-1063',
    day: 14,
    designBasis: SI_BASIS,
    priceBook: null,
    hasMembers: false,
    beams: [siBeam(['D1', 'Workshop', 9, 5, 510, 230, null, null])],
  },
];
