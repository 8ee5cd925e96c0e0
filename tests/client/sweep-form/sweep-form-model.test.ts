import { beamDemand } from '#shared/contract/beam-demand.ts';
import { describe, expect, it } from 'vitest';
import { MM_PER_IN } from '#shared/engine/units.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { readSweepForm } from '#client/src/features/sweep-form/read-sweep-form.ts';
import {
  axisCount,
  estimatedMs,
  problemOf,
  steelCount,
} from '#client/src/features/sweep-form/space-estimate.ts';
import { firstSweepForm, sweepForm } from '#client/src/features/sweep-form/sweep-form-defaults.ts';
import type { SweepFormValues } from '#client/src/features/sweep-form/sweep-form-values.ts';
import { parseCounts, parseValueList } from '#client/src/lib/value-list.ts';
import { countsText } from '#client/src/lib/counts-text.ts';
import { groupsText, parseGroups } from '#client/src/lib/parse-bar-groups.ts';
import { BEAM, PROJECT } from './office-project.ts';

const FIRST = firstSweepForm(PROJECT, BEAM);

const withAxis = (name: 'width' | 'depth' | 'fc', part: Partial<SweepFormValues['axes']['width']>) => ({
  ...FIRST,
  axes: { ...FIRST.axes, [name]: { ...FIRST.axes[name], ...part } },
});
const withSteel = (face: 'tension' | 'compression', part: Partial<SweepFormValues['steel']['tension']>) => ({
  ...FIRST,
  steel: { ...FIRST.steel, [face]: { ...FIRST.steel[face], ...part } },
});

function errorsOf(form: SweepFormValues): ReadonlyMap<string, string> {
  const reading = readSweepForm(form, 'us');
  return reading.kind === 'incomplete' ? reading.errors : new Map<string, string>();
}
function definitionOf(form: SweepFormValues) {
  const reading = readSweepForm(form, 'us');
  if (reading.kind === 'incomplete') throw new Error([...reading.errors.values()].join('; '));
  return reading.input.definition;
}

describe('numbers of bars as typed', () => {
  it('are read from ranges, lists and both', () => {
    expect(parseCounts('2–4, 8')).toEqual({ kind: 'values', values: [2, 3, 4, 8] });
    expect(parseCounts('2 - 4')).toEqual({ kind: 'values', values: [2, 3, 4] });
    expect(parseCounts('')).toEqual({ kind: 'values', values: [] });
  });

  it('are refused with what was typed where they cannot be read', () => {
    expect(parseCounts('8-2')).toMatchObject({
      kind: 'unreadable',
      problem: '8–2: the end is below the start',
    });
    expect(parseCounts('two')).toMatchObject({ kind: 'unreadable' });
    expect(parseCounts('1-900')).toMatchObject({ kind: 'unreadable' });
  });

  it('print as they are read', () => {
    expect(countsText([2, 3, 4, 5, 8])).toBe('2–5, 8');
    expect(countsText([2, 3])).toBe('2, 3');
  });
});

describe('lists of values as typed', () => {
  it('part at every comma, so that 300,350,400 are three widths', () => {
    expect(parseValueList('300,350,400', 'length', 'si')).toEqual({
      kind: 'values',
      values: [300, 350, 400],
    });
  });

  it('are converted, ordered and each taken once', () => {
    expect(parseValueList('14; 12 14', 'length', 'us')).toEqual({
      kind: 'values',
      values: [12 * MM_PER_IN, 14 * MM_PER_IN],
    });
  });
});

describe('bar groups as the trade writes them', () => {
  it('are read and printed alike', () => {
    const text = '2-#8 + 2-#6, 3-#8 + 2-#6';
    const reading = parseGroups(text);
    expect(reading.kind === 'groups' && groupsText(reading.groups)).toBe(text);
  });

  it('are refused by name', () => {
    expect(parseGroups('two #8')).toMatchObject({
      kind: 'unreadable',
      problem: expect.stringContaining('two #8'),
    });
  });
});

describe('a new sweep', () => {
  it('can be run as it opens, from the design basis and the beam’s demand', () => {
    const definition = definitionOf(FIRST);
    expect(spaceSize(definition.space)).toBe(5 * 19 * 3 * 28 * 13);
    expect(definition.demand).toEqual(beamDemand(BEAM));
    expect(definition.demand.muNmm).toBe(BEAM.muNmm);
    expect(definition.space.fy).toEqual({
      kind: 'list',
      values: [expect.closeTo(PROJECT.designBasis.fyMPa, 6)],
    });
  });

  it('opens in the sizes of its bar standard', () => {
    const si = {
      ...PROJECT,
      designBasis: { ...PROJECT.designBasis, units: 'si', barStandard: 'csa' },
    } as const;
    expect(firstSweepForm(si, BEAM).steel.tension.sizes).toEqual(['20M', '25M', '30M']);
  });

  it('is the same again after being stored and opened', () => {
    const definition = definitionOf({
      ...withSteel('tension', { mixedText: '2-#8 + 2-#6' }),
      stirrups: [{ bar: '', legs: 2, spacingMm: null, isDesigned: false }, ...FIRST.stirrups],
    });
    const reopened = sweepForm({ name: 'again', definition }, 'us');
    expect(definitionOf(reopened)).toEqual(definition);
  });

  it('keeps plain areas of a published problem', () => {
    const areas = withSteel('tension', {
      kind: 'areas',
      areasText: '6, 6.32',
      placedBy: 'share',
      shareOfDepth: 0.2,
    });
    const definition = definitionOf({
      ...areas,
      steel: { ...areas.steel, compression: { ...areas.steel.compression, kind: 'areas', areasText: '0' } },
    });
    expect(definition.space.tension).toMatchObject({ kind: 'areas', at: { shareOfDepth: 0.2 } });
    expect(definitionOf(sweepForm({ name: 'again', definition }, 'us'))).toEqual(definition);
  });
});

describe('what is wrong is said at its field', () => {
  it.each([
    ['an end below its start', withAxis('width', { from: 700 }), 'space.width.to', /end is below the start/],
    ['a step of zero', withAxis('depth', { step: 0 }), 'space.depth.step', /more than zero/],
    ['a negative step', withAxis('depth', { step: -1 }), 'space.depth.step', /more than zero/],
    ['text for a number', withAxis('fc', { from: Number.NaN }), 'space.fc.from', /must be a number/],
    ['an empty field', withAxis('fc', { to: null }), 'space.fc.to', /must be a number/],
    [
      'an empty list',
      withAxis('width', { kind: 'list', listText: '' }),
      'space.width.values',
      /at least one/,
    ],
    [
      'a list with a word',
      withAxis('width', { kind: 'list', listText: '12, x' }),
      'space.width.values',
      /“x”/,
    ],
    ['no sizes', withSteel('tension', { sizes: [] }), 'space.tension.sizes', /choose at least one size/],
    ['no counts', withSteel('tension', { countsText: '' }), 'space.tension.counts', /at least one count/],
    [
      'counts that cannot be read',
      withSteel('tension', { countsText: 'few' }),
      'space.tension.counts',
      /“few”/,
    ],
    [
      'an unplaced area',
      withSteel('tension', { kind: 'areas', areasText: '4', offsetMm: null }),
      'space.tension.at',
      /where/,
    ],
    ['no name', { ...FIRST, name: ' ' }, 'name', /missing/],
    ['a width of a slip of unit', withAxis('width', { to: 90_000 }), 'space.width.to', /at most/],
  ])('%s', (_, form, path, message) => {
    expect(errorsOf(form).get(path)).toMatch(message);
  });

  it('and nothing else is', () => {
    expect([...errorsOf(withAxis('width', { from: 700 })).keys()]).toEqual(['space.width.to']);
  });
});

describe('the size while typing', () => {
  it('counts what a range with a ragged end really makes', () => {
    const axis = { ...FIRST.axes.width, from: 10, to: 20.5, step: 2 };
    expect(axisCount(axis, 'width', 'si')).toBe(6);
  });

  it('is unknown while an axis cannot be read', () => {
    expect(axisCount({ ...FIRST.axes.width, step: 0 }, 'width', 'us')).toBeNull();
    expect(axisCount({ ...FIRST.axes.width, step: Number.NaN }, 'width', 'us')).toBeNull();
    expect(steelCount({ ...FIRST.steel.tension, countsText: '9-2' }, 'us')).toBeNull();
  });

  it('counts sizes, mixed groups and none', () => {
    expect(steelCount({ ...FIRST.steel.compression, mixedText: '2-#8 + 2-#6' }, 'us')).toBe(4 * 3 + 1 + 1);
  });

  it('asks the engine on the project’s own basis', () => {
    const problem = problemOf(PROJECT, definitionOf(FIRST));
    expect(problem.basis).toMatchObject({ ruleSet: 'aci318-19', rates: null });
    expect(Object.keys(problem.basis)).not.toContain('units');
  });

  it('takes the time from this sweep’s own last long run', () => {
    const run = {
      method: 'every-section',
      state: 'finished',
      evaluated: 1_000_000,
      elapsedMs: 1000,
    } as Parameters<typeof estimatedMs>[1][number];
    expect(estimatedMs(2_000_000, [run]) - estimatedMs(1_000_000, [run])).toBeCloseTo(1000, 6);
    expect(estimatedMs(2_000_000, [{ ...run, evaluated: 10 }])).toBe(estimatedMs(2_000_000, []));
    expect(estimatedMs(2_000_000, [run], true)).toBeGreaterThan(4 * estimatedMs(2_000_000, [run]));
  });
});
