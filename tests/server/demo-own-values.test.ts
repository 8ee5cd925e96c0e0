import { expect, test } from 'vitest';
import { ownValuesOf } from '#server/demo/own-values.ts';
import { compareOwnValue } from '#shared/sheet/own-value.ts';
import { candidateOf } from '../sheet/hand-candidate.ts';

test('the demo’s checker works with three figures of its own: strength agrees, the axis without displaced concrete does not', () => {
  const { snapshot } = candidateOf();
  const own = ownValuesOf(snapshot, 'si', { by: { id: '1', name: 'C. Checker' }, at: new Date(0) });
  const verdicts = new Map(
    own.map(({ line, value, onSheet }) => [line, compareOwnValue(value, onSheet).meets]),
  );
  for (const line of ['beta1', 'mn', 'phi-mn', 'kd', 'phi-y', 'vs'])
    expect([line, verdicts.get(line)]).toEqual([line, true]);
  for (const line of ['c', 'phi-u', 'mu-phi']) expect([line, verdicts.get(line)]).toEqual([line, false]);
  expect(own.find(({ line }) => line === 'mn')!.value).toBe(247e6);
});
