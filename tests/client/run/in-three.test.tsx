import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ComponentProps } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { ResultInThree } from '#shared/sweep/result.ts';
import { InThreeChoice } from '#client/src/features/run/in-three-choice.tsx';

afterEach(cleanup);

const point = (index: number) => ({ index, x: 20 + index, y: 600, z: 6, tieCount: 1, ties: [index] });
const found = (count: number | null, listed: number): ResultInThree => ({
  count,
  points: Array.from({ length: listed }, (_, index) => point(index)),
});

function show(props: Partial<ComponentProps<typeof InThreeChoice>>) {
  const onChange = vi.fn();
  const view = { x: 'steelKgPerM', y: 'depthMm', z: 'curvatureDuctility' } as const;
  const given = { view, third: view.z, inThree: null, isByBounds: false, ...props };
  render(<InThreeChoice reader={{ units: 'si', currency: null }} onChange={onChange} {...given} />);
  return onChange;
}

const box = () => screen.getByRole('checkbox', { name: 'Front in three measures' });
const told = () => screen.getByRole('status').textContent;

describe('the choice of a front in three measures', () => {
  it('is offered for a measure that no axis shows, and for nothing else', async () => {
    const onChange = show({ view: { x: 'steelKgPerM', y: 'depthMm' } });
    expect(screen.queryByRole('status')).toBeNull();
    await userEvent.click(box());
    expect(onChange).toHaveBeenCalledExactlyOnceWith(true);
    for (const third of [null, 'steelKgPerM', 'fc'] as const) {
      cleanup();
      show({ third });
      expect(screen.queryByRole('checkbox')).toBeNull();
    }
  });

  it('says what marks and line are, and of which marks those of the line stand in meanwhile', () => {
    show({ inThree: found(3, 3) });
    expect(told()).toBe(
      'Marks: 3 sections that can be bettered in none of the three measures without loss in another. ' +
        'Line: the same in the two of the axes.',
    );
    cleanup();
    show({ inThree: null });
    expect(told()).toContain('is being found');
  });

  it('says so where not all are marked, and where there are too many to be held', () => {
    show({ inThree: found(12_345, 3) });
    expect(told()).toContain('There are 12,345; marked and listed are those with the least steel.');
    cleanup();
    show({ inThree: found(null, 0) });
    expect(told()).toContain('More than 131,072 sections');
  });

  it('is not to be had of a run by bounds, and says why', () => {
    show({ view: { x: 'steelKgPerM', y: 'depthMm' }, isByBounds: true });
    expect(box()).toHaveProperty('disabled', true);
    expect(screen.getByText('A run by bounds finds fronts in two measures only.')).toBeTruthy();
  });
});
