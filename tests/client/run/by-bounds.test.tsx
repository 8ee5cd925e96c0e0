import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { BoundedSearch } from '#shared/sweep/bounded-search.ts';
import { boundedResult } from '#shared/sweep/bounded-result.ts';
import { MAX_SECTIONS_PER_RUN } from '#shared/sweep/run-method.ts';
import { NothingFeasible } from '#client/src/features/run/nothing-feasible.tsx';
import { feasibleClaim, proofClaim } from '#client/src/features/run/proof-words.ts';
import { createSectionSource } from '#client/src/features/run/section-source.ts';
import { WhyPanel } from '#client/src/features/run/why-panel.tsx';
import { BoundsChoice } from '#client/src/features/sweep-form/bounds-choice.tsx';
import { BASIS, DEFINITION } from './problem.ts';

afterEach(cleanup);

const PROBLEM = { ...DEFINITION, basis: BASIS };
const search = new BoundedSearch(PROBLEM, DEFINITION.view);
while (!search.advance(4096));
const outcome = { state: search.state, found: search.found, near: search.near };
const PROVEN = boundedResult(PROBLEM, DEFINITION.view, { ...outcome, isProven: true });
const STOPPED = boundedResult(PROBLEM, DEFINITION.view, { ...outcome, isProven: false });
const vast = { ...PROVEN, sectionCount: 9_200_000_000, evaluated: 270_000 };

describe('the proof line of a run by bounds', () => {
  it('says how few sections were evaluated and that the rest need not be', () => {
    expect(proofClaim(vast, 'finished')).toBe(
      '9,200,000,000 sections; 270,000 evaluated, the rest proven unnecessary; none better than the front',
    );
    expect(feasibleClaim(vast)).toContain('not counted');
  });

  it('claims nothing of a search that was stopped', () => {
    const claim = proofClaim({ ...STOPPED, sectionCount: vast.sectionCount }, 'cancelled');
    expect(claim).toContain('front not proven');
    expect(claim).not.toContain('none better');
    expect(proofClaim({ ...STOPPED, front: [] }, 'cancelled')).toContain('the rest not settled');
  });

  it('says of an empty front that the whole space is behind it', () => {
    expect(proofClaim({ ...vast, front: [] }, 'finished')).toContain(
      'the rest proven unable to meet every check: none does',
    );
  });
});

describe('the panels of a run by bounds', () => {
  const source = createSectionSource({ definition: DEFINITION, basis: BASIS });
  const reader = { units: 'si', currency: null, code: BASIS.ruleSet } as const;
  const common = { definition: DEFINITION, source, reader, onSelect: vi.fn() };

  it('say that nothing was counted, and never zero', () => {
    render(<WhyPanel {...common} result={vast} selectedIndex={null} />);
    expect(screen.getByText(/is not known then/)).toBeTruthy();
    expect(screen.queryByText('Nothing fell out: every section meets every check.')).toBeNull();
    expect(screen.queryByText('0')).toBeNull();
  });

  it('tell an empty front that is proven from one that is not', () => {
    const { rerender } = render(<NothingFeasible {...common} result={{ ...vast, front: [] }} />);
    expect(screen.getByText('None of 9,200,000,000 sections meets every check')).toBeTruthy();
    rerender(<NothingFeasible {...common} result={{ ...STOPPED, front: [] }} />);
    expect(screen.getByText(/before the search was stopped/)).toBeTruthy();
  });
});

describe('the choice to search by bounds', () => {
  const setup = (size: number, isByCurve = false) => {
    const onChange = vi.fn();
    render(<BoundsChoice size={size} isByCurve={isByCurve} value={undefined} onChange={onChange} />);
    return onChange;
  };

  it('is a choice while every section could be evaluated', async () => {
    const onChange = setup(MAX_SECTIONS_PER_RUN);
    await userEvent.setup().click(screen.getByRole('checkbox', { name: 'Search by bounds' }));
    expect(onChange).toHaveBeenCalledWith('bounds');
  });

  it('is settled beyond that, with the reason', () => {
    setup(MAX_SECTIONS_PER_RUN + 1);
    expect(screen.getByRole<HTMLInputElement>('checkbox').disabled).toBe(true);
    expect(screen.getByText(/More than the 200,000,000/)).toBeTruthy();
  });

  it('is not offered for small spaces, nor where μφ is read off the full curve', () => {
    setup(2880);
    setup(1e9, true);
    expect(screen.queryByRole('checkbox')).toBeNull();
  });
});
