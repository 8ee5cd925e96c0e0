import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { BARS } from '#shared/engine/bars.ts';
import type { BarGroup, BarStandard, Face, SectionInput } from '#shared/engine/section.ts';
import { MM_PER_IN, MPA_PER_PSI } from '#shared/engine/units.ts';
import type { Space, SteelSet } from '#shared/sweep/problem.ts';

export const STEP_INPUTS = ['width', 'depth', 'fc', 'tension', 'compression'] as const;
/** What one step is taken in. */
export type StepInput = (typeof STEP_INPUTS)[number];

/** The section with one input moved by one step. */
export interface Step {
  readonly input: StepInput;
  readonly direction: 'less' | 'more';
  readonly section: SectionInput;
  /** Its number in the swept space; null where it was not swept. */
  readonly index: number | null;
}

export interface StepSetting {
  readonly units: UnitSystem;
  readonly standard: BarStandard;
  /** The space of a run; null for a section by hand, which steps as an office would. */
  readonly space: Space | null;
}

type NumberInput = 'width' | 'depth' | 'fc';
const KEY = { width: 'widthMm', depth: 'depthMm', fc: 'fcMPa' } as const;

/** Steps of forms and mixes where no range says otherwise: common practice, no source. */
const OFFICE_STEP: Readonly<Record<UnitSystem, Readonly<Record<NumberInput, number>>>> = {
  us: { width: 2 * MM_PER_IN, depth: MM_PER_IN, fc: 1000 * MPA_PER_PSI },
  si: { width: 50, depth: 25, fc: 5 },
};
/** Two values nearer than this are one. */
const SAME = 1e-6;

/** Every section one step away from this one, in the order of `STEP_INPUTS`, less before more. */
export function stepsFrom(section: SectionInput, setting: StepSetting): Step[] {
  return STEP_INPUTS.flatMap((input) => {
    const moved =
      input === 'tension' || input === 'compression'
        ? barSteps(section, input, setting.standard)
        : numberSteps(section, input, setting);
    return moved.map(({ direction, section: next }) => ({
      input,
      direction,
      section: next,
      index: setting.space === null ? null : indexIn(setting.space, next),
    }));
  });
}

type Moved = Pick<Step, 'direction' | 'section'>;

function numberSteps(section: SectionInput, input: NumberInput, { units, space }: StepSetting): Moved[] {
  const values = space === null ? [] : axisOf(space, input);
  const value = section[KEY[input]];
  return (['less', 'more'] as const).flatMap((direction) => {
    const next = nextValue(values, value, direction, OFFICE_STEP[units][input]);
    return next > 0 ? [{ direction, section: { ...section, [KEY[input]]: next } }] : [];
  });
}

const axisOf = (space: Space, input: NumberInput): readonly number[] =>
  ({ width: space.widthsMm, depth: space.depthsMm, fc: space.fcMPa })[input];

/** The next value of the range, or as far again beyond its end; by the office's step where there is no range. */
function nextValue(
  values: readonly number[],
  value: number,
  direction: Step['direction'],
  officeStep: number,
): number {
  const sign = direction === 'more' ? 1 : -1;
  const sorted = values.toSorted((a, b) => a - b);
  const at = sorted.findIndex((one) => Math.abs(one - value) < SAME);
  const next = at === -1 ? undefined : sorted[at + sign];
  if (next !== undefined) return next;
  const before = at === -1 ? undefined : sorted[at - sign];
  return value + sign * (before === undefined ? officeStep : Math.abs(value - before));
}

/** One bar less or more, then all bars of one size by the next smaller or larger; only where a face has one size. */
function barSteps(section: SectionInput, face: Face, standard: BarStandard): Moved[] {
  const { reinforcement } = section;
  if (reinforcement.kind !== 'bars') return [];
  const [own, second] = reinforcement[face];
  if (own === undefined || second !== undefined) return [];
  const sizes = BARS[standard].map((bar) => bar.designation);
  const with_ = (direction: Step['direction'], group: BarGroup): Moved => ({
    direction,
    section: { ...section, reinforcement: { ...reinforcement, [face]: group } },
  });
  const size = sizes.indexOf(own.bar);
  const resized = ([-1, 1] as const).flatMap((by) => {
    const bar = sizes[size + by];
    return size === -1 || bar === undefined ? [] : [with_(by < 0 ? 'less' : 'more', [{ ...own, bar }])];
  });
  const isLastOfTension = own.count === 1 && face === 'tension';
  return [
    ...(isLastOfTension ? [] : [with_('less', own.count === 1 ? [] : [{ ...own, count: own.count - 1 }])]),
    with_('more', [{ ...own, count: own.count + 1 }]),
    ...resized,
  ];
}

/** The section's place in the space, or null where one of its values was not swept. */
function indexIn(space: Space, section: SectionInput): number | null {
  const { reinforcement } = section;
  if (reinforcement.kind !== 'bars') return null;
  const near = (values: readonly number[], value: number) =>
    values.findIndex((one) => Math.abs(one - value) < SAME);
  const sameBars = (sets: readonly SteelSet[], bars: BarGroup) =>
    sets.findIndex((set) => set.kind === 'bars' && JSON.stringify(set.bars) === JSON.stringify(bars));
  const sameStirrup = space.stirrups.findIndex(
    (one) => JSON.stringify(one) === JSON.stringify(section.stirrup),
  );
  // Outermost first, as the space counts.
  const digits: readonly (readonly [place: number, length: number])[] = [
    [near(space.widthsMm, section.widthMm), space.widthsMm.length],
    [near(space.coversMm, section.coverMm), space.coversMm.length],
    [sameStirrup, space.stirrups.length],
    [sameBars(space.tension, reinforcement.tension), space.tension.length],
    [sameBars(space.compression, reinforcement.compression), space.compression.length],
    [near(space.fyMPa, section.fyMPa), space.fyMPa.length],
    [near(space.fcMPa, section.fcMPa), space.fcMPa.length],
    [near(space.depthsMm, section.depthMm), space.depthsMm.length],
  ];
  return digits.some(([place]) => place === -1)
    ? null
    : digits.reduce((index, [place, length]) => index * length + place, 0);
}
