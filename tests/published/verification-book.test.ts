import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { computeBook, isComputed } from '#shared/verification/book.ts';
import { compare } from '#shared/verification/comparison.ts';
import { COMPUTATIONS } from '#shared/verification/computations.ts';
import { allowedText, computedText, differenceText, printedText } from '#shared/verification/number-text.ts';
import { OUT_OF_SCOPE } from '#shared/verification/out-of-scope.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { PROVENANCES, type PublishedCase } from '#shared/verification/published-case.ts';
import { findWorst, summarise } from '#shared/verification/summary.ts';
import { PUBLISHED_CASES } from '#shared/verification/topics.ts';
import { verificationBookText } from '#server/cli/verification-book-text.ts';

const atRoot = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url));
const ids = PUBLISHED_CASES.map(({ id }) => id);

/** A case of its own, for what no published one does. */
const made = (changes: Partial<PublishedCase>): PublishedCase => ({
  id: 'X-01',
  topic: 'made',
  source: 'made for this test',
  provenance: 'derived',
  kind: 'made',
  inputs: {},
  expected: { a: 100, list: [1, null, 0] },
  tolerance: 0.01,
  assumptions: '',
  ...changes,
});

describe('the verification book', () => {
  it('holds every case once, either computed or out of scope with a reason, never both', () => {
    expect(new Set(ids).size).toBe(ids.length);
    for (const published of PUBLISHED_CASES)
      expect(
        [isComputed(published), published.id in OUT_OF_SCOPE].filter(Boolean),
        published.id,
      ).toHaveLength(1);
    for (const reason of Object.values(OUT_OF_SCOPE)) expect(reason).not.toBe('');
    expect([...Object.keys(COMPUTATIONS), ...Object.keys(OUT_OF_SCOPE)].sort()).toEqual([...ids].sort());
  });

  it('names for every case its source, where its numbers come from, what kind it is, and a tolerance', () => {
    for (const published of PUBLISHED_CASES) {
      for (const text of [published.source, published.topic, published.kind, published.assumptions])
        expect(text, published.id).toMatch(/\S{2}/);
      expect(PROVENANCES, published.id).toContain(published.provenance);
      expect(published.tolerance, published.id).toBeGreaterThan(0);
      expect(published.tolerance, published.id).toBeLessThanOrEqual(0.03);
      for (const key of Object.keys(published.abs_tolerance ?? {}))
        expect(Object.keys(published.expected), `${published.id} tolerance of ${key}`).toContain(key);
    }
  });

  it('compares each printed number, and says so when one is missing, no number, or outside', () => {
    const published = made({ abs_tolerance: { list: 0.5 } });
    const names = (computed: Parameters<typeof compare>[1]) =>
      compare(published, computed).map(({ name, isWithin }) => [name, isWithin]);
    expect(names({ a: 100.9, list: [1.4, 7, -0.4] })).toEqual([
      ['a', true],
      ['list[0]', true],
      ['list[2]', true],
    ]);
    expect(names({ a: 101.1, list: [1.6] })).toEqual([
      ['a', false],
      ['list[0]', false],
      ['list[2]', false],
    ]);
    expect(compare(published, {}).every(({ isWithin }) => !isWithin)).toBe(true);
    expect(compare(published, { a: Infinity, list: [NaN] }).every(({ isWithin }) => !isWithin)).toBe(true);
    expect(() => compare(made({ expected: { a: 'much' } }), { a: 1 })).toThrow('X-01 a');
  });

  it('holds a value that must lie below the printed one to that, and leaves it out of the worst difference', () => {
    const below = (value: number) =>
      compare(made({ expected: { a: 10 } }), { a: { belowPrinted: value, because: 'so' } });
    expect(below(4)[0]!.isWithin).toBe(true);
    expect(below(10)[0]!.isWithin).toBe(false);
    const one = { published: made({}), comparisons: below(4), isReproduced: true };
    expect(findWorst([one])).toBeNull();
    const lost = { ...one, comparisons: [...compare(made({}), { a: 102 }), ...below(4)] };
    expect(findWorst([lost])!.comparison.name).toBe('list[0]');
  });

  it('names a place in a list by the inputs of as many values', () => {
    const table = made({
      inputs: { n: [2, 3], bar: [8, 9], d: 1 },
      expected: {
        b: [
          [1, 2],
          [3, 4],
        ],
        c: [1, 2, 3],
      },
    });
    const places = compare(table, {}).map(({ places: at }) => at.map(({ input, value }) => [input, value]));
    expect(places[1]).toEqual([
      ['n', 2],
      ['bar', 9],
    ]);
    expect(places[4]).toEqual([[null, 1]]);
  });

  it('writes numbers so that a difference can be seen and a machine’s last bit cannot', () => {
    const of = (printed: number, computed: number) =>
      compare(made({ expected: { a: printed } }), { a: computed })[0]!;
    expect([printedText(3_800_755), printedText(3.95e-5), printedText(-0.5)]).toEqual([
      '3,800,755',
      '3.95 × 10⁻⁵',
      '−0.5',
    ]);
    expect(computedText(of(5.04, 5.042017))).toBe('5.0420');
    expect(differenceText(of(5.04, 5.042017))).toBe('+0.04 %');
    expect(differenceText(of(5.04, 5.03))).toBe('−0.2 %');
    expect(differenceText(of(0.85, 0.85 + 1.2e-16))).toBe('0 %');
    expect(computedText(of(1, NaN))).toBe('no number');
    expect(allowedText({ kind: 'relative', by: 0.003 })).toBe('± 0.3 %');
    expect(allowedText({ kind: 'relative', by: 1e-9 })).toBe('± 1 × 10⁻⁷ %');
    expect(allowedText({ kind: 'absolute', by: 0.0125 })).toBe('± 0.0125');
  });

  it('is written out in docs/verification-book.md; `npm run verification` brings it up to date', () => {
    expect(readFileSync(atRoot('docs/verification-book.md'), 'utf8')).toBe(
      verificationBookText(computeBook()),
    );
  });

  it('counts what it holds', () => {
    const results = computeBook();
    const all = summarise(results);
    expect(all.cases + all.outOfScope).toBe(PUBLISHED_CASES.length);
    expect(all.reproduced).toBe(all.cases);
    expect(all.values).toBeGreaterThan(400);
    expect(all.worst!.comparison.relative).toBe(
      Math.max(...results.map((result) => summarise([result]).worst?.comparison.relative ?? 0)),
    );
  });

  it('lists only properties that a test runs by the number it lists', () => {
    const tests = ['tests/engine', 'tests/sweep']
      .flatMap((folder) => readdirSync(atRoot(folder)).map((name) => `${folder}/${name}`))
      .filter((name) => name.endsWith('.test.ts'))
      .map((name) => readFileSync(atRoot(name), 'utf8'))
      .join('\n');
    const untested = Object.keys(PROPERTIES).filter(
      (id) => !tests.includes(`PROPERTIES['${id}']`) && !tests.includes(`PROPERTIES.${id}.`),
    );
    expect(untested).toEqual([]);
  });
});
