import { z } from 'zod';
import type { Evaluation } from '../engine/evaluation.ts';
import type { Studies } from '../engine/studies.ts';
import type { ViewResult } from '../sweep/result.ts';
import { RUN_METHODS } from '../sweep/run-method.ts';
import {
  designBasisSchema,
  fullBasisSchema,
  priceBookSchema,
  savedDesignBasisSchema,
} from './design-basis.ts';
import {
  bounded,
  depthMmSchema,
  idSchema,
  momentNmmSchema,
  nonEmptyText,
  shearNSchema,
  spanMmSchema,
} from './numbers.ts';
import { demandSchema, sectionInputSchema, userRulesSchema } from './section-input.ts';
import { openedViewSchema, sweepDefinitionSchema } from './sweep-definition.ts';

/** The engine's and the sweep's own outputs are trusted on the way out; the schema names them without re-checking. */
const evaluationSchema = z.custom<Evaluation>((v) => typeof v === 'object' && v !== null);
const studiesSchema = z.custom<Studies>((v) => typeof v === 'object' && v !== null);
const viewResultSchema = z.custom<ViewResult>((v) => typeof v === 'object' && v !== null);

export const ROLES = ['admin', 'engineer', 'checker', 'estimator', 'viewer'] as const;
export type Role = (typeof ROLES)[number];

const timestamp = z.iso.datetime();

export const personSchema = z.object({
  id: idSchema,
  name: z.string(),
  email: z.string(),
  role: z.enum(ROLES),
});
export type Person = z.infer<typeof personSchema>;

export const sessionSchema = z.object({ person: personSchema.nullable(), csrfToken: z.string() });
export type Session = z.infer<typeof sessionSchema>;

export const signInSchema = z.object({
  email: z.string({ error: 'E-mail is missing' }).trim().min(1, 'E-mail is missing').max(200),
  password: z.string({ error: 'Password is missing' }).min(1, 'Password is missing').max(200),
});

export const projectInputSchema = z.object({
  name: nonEmptyText('Project name', 120),
  number: nonEmptyText('Project number', 40),
  designBasis: savedDesignBasisSchema,
});
export const projectSchema = projectInputSchema.extend({
  id: idSchema,
  createdAt: timestamp,
  beamCount: z.number(),
  candidateCount: z.number(),
  approvedCount: z.number(),
  members: z.array(personSchema),
  /** Null where the reader may not see rates, or none are set. */
  priceBook: priceBookSchema.nullable(),
});
export type Project = z.infer<typeof projectSchema>;

export const membersInputSchema = z.object({
  personIds: z
    .array(idSchema)
    .min(1, 'A project needs at least one member')
    .max(500, 'A project takes at most 500 members'),
});

export const beamInputSchema = z.object({
  mark: nonEmptyText('Mark', 40),
  location: z.string().trim().max(200),
  spanMm: spanMmSchema,
  count: z
    .number({ error: 'Count must be a whole number' })
    .int('Count must be a whole number')
    .min(1, 'Count must be at least 1')
    .max(10_000, 'Count must be at most 10000'),
  muNmm: momentNmmSchema,
  /** Kept with the beam for the shear design; null where not known yet. */
  vuN: shearNSchema.nullable(),
  ductilityTarget: bounded('Ductility target μφ', 0, 100, '').nullable(),
  depthCapMm: depthMmSchema.nullable(),
});
export const beamSchema = beamInputSchema.extend({
  id: idSchema,
  projectId: idSchema,
  sweepCount: z.number(),
  candidateCount: z.number(),
});
export type BeamInput = z.infer<typeof beamInputSchema>;
export type Beam = z.infer<typeof beamSchema>;

export const RUN_STATES = ['queued', 'running', 'finished', 'cancelled', 'failed'] as const;
export type RunState = (typeof RUN_STATES)[number];

/** How far a search by bounds is. */
const searchProgressSchema = z.object({
  /** Boxes still to be looked into, and done with: split, evaluated or ruled out. */
  boxesOpen: z.number(),
  boxesClosed: z.number(),
  /** Sections in boxes that were ruled out. */
  provenUnnecessary: z.number(),
});
export type SearchProgress = z.infer<typeof searchProgressSchema>;

/** Live state of one view of a run; what the event stream sends. */
export const viewProgressSchema = z.object({
  viewId: idSchema,
  /** Increases with every change of one of the run's views: of two states of a view, the one with more is the later. */
  sequence: z.number(),
  view: openedViewSchema,
  state: z.enum(RUN_STATES),
  evaluated: z.number(),
  /** Null by bounds: it is not counted. */
  feasible: z.number().nullable(),
  sectionCount: z.number(),
  /** Null where every section is evaluated, and before a search by bounds has begun. */
  search: searchProgressSchema.nullable(),
  elapsedMs: z.number(),
  /** The final result, or the part that is done. Null until the first chunk. */
  result: viewResultSchema.nullable(),
  message: z.string().nullable(),
});
export type ViewProgress = z.infer<typeof viewProgressSchema>;
/** As the event stream tells it: without the result where the reader has that already. */
export const viewEventSchema = viewProgressSchema.partial({ result: true });
export type ViewEvent = z.infer<typeof viewEventSchema>;

/** Where a view stands that nobody works on yet: views taken before it, and processes that take any. */
export const queuePositionSchema = z.object({ viewId: idSchema, ahead: z.number(), workers: z.number() });
export type QueuePosition = z.infer<typeof queuePositionSchema>;

export const runSummarySchema = z.object({
  id: idSchema,
  sweepId: idSchema,
  number: z.number(),
  state: z.enum(RUN_STATES),
  method: z.enum(RUN_METHODS),
  sectionCount: z.number(),
  evaluated: z.number(),
  /** Null by bounds: it is not counted. */
  feasible: z.number().nullable(),
  frontCount: z.number(),
  hash: z.string().nullable(),
  engineVersion: z.string(),
  startedBy: personSchema.pick({ id: true, name: true }),
  createdAt: timestamp,
  elapsedMs: z.number().nullable(),
});
export type RunSummary = z.infer<typeof runSummarySchema>;

/** One immutable execution: everything frozen, and its views. */
export const runSchema = runSummarySchema.extend({
  projectId: idSchema,
  beam: beamSchema.pick({ id: true, mark: true, location: true, spanMm: true, count: true }),
  sweepName: z.string(),
  definition: sweepDefinitionSchema,
  /** Rates are null where the reader may not see them. */
  basis: fullBasisSchema,
  /** Sections taken over from an earlier run instead of being computed again; null where there were none to take. */
  taken: z.object({ runId: idSchema, number: z.number(), sections: z.number() }).nullable(),
  views: z.array(viewProgressSchema.omit({ result: true })),
});
export type Run = z.infer<typeof runSchema>;

export const sweepInputSchema = z.object({
  name: nonEmptyText('Sweep name', 120),
  definition: sweepDefinitionSchema,
});
export const sweepSchema = sweepInputSchema.extend({
  id: idSchema,
  projectId: idSchema,
  beamId: idSchema,
  beamMark: z.string(),
  createdAt: timestamp,
  updatedAt: timestamp,
  runs: z.array(runSummarySchema),
});
export type Sweep = z.infer<typeof sweepSchema>;

/** A typed section judged on the project's basis. */
export const evaluateInputSchema = z.object({
  section: sectionInputSchema,
  demand: demandSchema,
  rules: userRulesSchema,
  /** Override of the project's basis for this one evaluation, e.g. to reproduce a printed example. */
  basis: designBasisSchema.omit({ units: true, fyMPa: true, coverMm: true }).partial(),
});
export type EvaluateInput = z.infer<typeof evaluateInputSchema>;
export const evaluateOutputSchema = z.object({ section: sectionInputSchema, evaluation: evaluationSchema });

export const CANDIDATE_STATES = ['proposed', 'checked', 'approved', 'returned', 'superseded'] as const;
export type CandidateState = (typeof CANDIDATE_STATES)[number];

/** What is frozen when a candidate is pinned; `hash` is SHA-256 over its canonical JSON. */
export const snapshotSchema = z.object({
  section: sectionInputSchema,
  demand: demandSchema,
  rules: userRulesSchema,
  basis: fullBasisSchema,
  engineVersion: z.string(),
  evaluation: evaluationSchema,
  /** Curve, second algorithm, twin, scatter; pins from before they were frozen too have none. */
  studies: studiesSchema.optional(),
});
export type Snapshot = z.infer<typeof snapshotSchema>;

export const pinInputSchema = z.object({
  beamId: idSchema,
  source: z.discriminatedUnion('kind', [
    z.object({ kind: z.literal('run'), runId: idSchema, index: z.number().int().min(0) }),
    z.object({ kind: z.literal('section'), section: sectionInputSchema }),
  ]),
  note: z.string().trim().max(2000, 'The note is longer than 2000 characters'),
});
export type PinInput = z.infer<typeof pinInputSchema>;

const commentSchema = z.object({
  id: idSchema,
  author: personSchema.pick({ id: true, name: true, role: true }),
  text: z.string(),
  createdAt: timestamp,
});

/** A checker's own value for one line of the calculation sheet, in stored units, beside the sheet's. */
export const sheetValueSchema = z.object({
  line: z.string(),
  value: z.number(),
  onSheet: z.number(),
  by: personSchema.pick({ id: true, name: true }),
  updatedAt: timestamp,
});
export type SheetValue = z.infer<typeof sheetValueSchema>;

export const sheetValuesSchema = z.object({
  values: z.array(sheetValueSchema),
  /** Whether the reader may write own values now. */
  mayWrite: z.boolean(),
});

export const sheetValueInputSchema = z.object({
  line: nonEmptyText('Line', 80),
  /** Null takes the own value away. */
  value: bounded('Own value', -1e18, 1e18, '').nullable(),
});
export type SheetValueInput = z.infer<typeof sheetValueInputSchema>;

const transitionSchema = z.object({
  id: idSchema,
  from: z.enum(CANDIDATE_STATES).nullable(),
  to: z.enum(CANDIDATE_STATES),
  by: personSchema.pick({ id: true, name: true, role: true }),
  note: z.string(),
  /** Own values of the sheet as they stood when it was checked or approved; null for every other step. */
  sheetValues: z.array(sheetValueSchema).nullable(),
  createdAt: timestamp,
});

/** Tonnes by bar size for span × count; null cost where a rate is missing or hidden. */
export const takeoffSchema = z.object({
  spanMm: z.number(),
  count: z.number(),
  lines: z.array(
    z.object({
      bar: z.string(),
      position: z.enum(['tension', 'compression', 'skin', 'stirrups']),
      tonnes: z.number(),
    }),
  ),
  netTonnes: z.number(),
  lapsTonnes: z.number(),
  wasteTonnes: z.number(),
  totalTonnes: z.number(),
  concreteM3: z.number(),
  formworkM2: z.number(),
  cost: z.number().nullable(),
  currency: z.string().nullable(),
  co2eKg: z.number().nullable(),
});
export type Takeoff = z.infer<typeof takeoffSchema>;

export const candidateSchema = z.object({
  id: idSchema,
  projectId: idSchema,
  beam: beamSchema.pick({ id: true, mark: true, location: true, spanMm: true, count: true }),
  /** Short label within the project, A, B, … Z, AA. */
  label: z.string(),
  state: z.enum(CANDIDATE_STATES),
  note: z.string(),
  author: personSchema.pick({ id: true, name: true }),
  runId: idSchema.nullable(),
  sectionIndex: z.number().nullable(),
  snapshot: snapshotSchema,
  hash: z.string(),
  /** False when today's engine gives other numbers than the frozen ones. */
  isReproducedByCurrentEngine: z.boolean(),
  takeoff: takeoffSchema,
  comments: z.array(commentSchema),
  transitions: z.array(transitionSchema),
  createdAt: timestamp,
  /** States the reader may move it to now. */
  allowedTransitions: z.array(z.enum(CANDIDATE_STATES)),
});
export type Candidate = z.infer<typeof candidateSchema>;

export const transitionInputSchema = z.object({
  to: z.enum(CANDIDATE_STATES),
  note: z.string().trim().max(2000, 'The note is longer than 2000 characters'),
});
export const commentInputSchema = z.object({ text: nonEmptyText('Comment', 4000) });

export const shareLinkSchema = z.object({
  id: idSchema,
  token: z.string(),
  createdBy: z.string(),
  createdAt: timestamp,
  expiresAt: timestamp,
});
export type ShareLink = z.infer<typeof shareLinkSchema>;

/** What a link shows without signing in: the shortlist, no rates, no comments. */
export const sharedShortlistSchema = z.object({
  projectName: z.string(),
  projectNumber: z.string(),
  units: designBasisSchema.shape.units,
  candidates: z.array(candidateSchema.omit({ comments: true, transitions: true, allowedTransitions: true })),
});
export type SharedShortlist = z.infer<typeof sharedShortlistSchema>;
