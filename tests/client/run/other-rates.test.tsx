import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Ranking } from '#shared/contract/ranking.ts';
import type { Run } from '#shared/contract/records.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import {
  ratesText,
  ratesWords,
  readRates,
  withBase,
  withChange,
} from '#client/src/features/run/asked-rates.ts';
import { takenClaim } from '#client/src/features/run/proof-words.ts';
import { RatesBar } from '#client/src/features/run/rates-bar.tsx';
import { rankedClaim, winnerWords } from '#client/src/features/run/ranking-words.ts';
import { readRunAddress } from '#client/src/features/run/run-address.ts';
import type { RankedRun } from '#client/src/features/run/use-ranking.ts';
import { BASIS, DEFINITION } from './problem.ts';

afterEach(cleanup);

const PROBLEM = { ...DEFINITION, basis: BASIS };
const { view } = DEFINITION;
const RESULT = finishResult(
  PROBLEM,
  view,
  sweepRange(prepareSweep(PROBLEM, view), 0, spaceSize(DEFINITION.space)),
);
const best = RESULT.front[0]!;
const READER = { units: 'si', currency: 'EUR', code: BASIS.ruleSet } as const;

const ranking = (more: Partial<Ranking> = {}): Ranking => ({
  rates: null,
  result: RESULT,
  count: RESULT.feasible!,
  bandCount: 7,
  runWinner: { index: best.index, atRunRates: best, atTheseRates: best },
  isSameWinner: true,
  tookMs: 41.7,
  ...more,
});

describe('rates in the address', () => {
  it.each([
    [null, null],
    ['run', null],
    ['today', 'today'],
    ['today;steel:10;formwork:-15', 'today;steel:10;formwork:-15'],
    ['run;steel:0;concrete:12.5', 'run;concrete:12.5'],
    ['run;steel:1e9;steel:-100;gold:5;formwork:', null],
    ['tomorrow;steel:5', null],
    ['<b>', null],
  ])('%s is read as %s', (text, read) => {
    const asked = readRates(text);
    expect(ratesText(asked)).toBe(read);
    const params = new URLSearchParams(text === null ? '' : { rates: text });
    expect(readRunAddress(params, view).rates).toEqual(asked);
  });

  it('hold no rate, only what differs', () => {
    const asked = withChange(withBase(null, 'today')!, 'steel', 10)!;
    expect(ratesText(asked)).toBe('today;steel:10');
    expect(ratesText(withBase(withChange(asked, 'steel', 0), 'run'))).toBeNull();
    expect(ratesWords(withChange(asked, 'concreteCarbon', -7.5)!)).toBe(
      'the price book of today, steel +10 %, carbon of concrete −7.5 %',
    );
  });
});

describe('a ranking at other rates', () => {
  it('says whether the same section comes first, and what the run’s own would give away', () => {
    expect(winnerWords(ranking(), READER)).toBe('The same section comes first as at the run’s own rates.');
    const worse = { x: best.x * 1.018, y: best.y };
    const other = ranking({
      isSameWinner: false,
      runWinner: { index: 5, atRunRates: best, atTheseRates: worse },
    });
    expect(winnerWords(other, READER)).toMatch(
      /Another section comes first.* kg\/m against .* kg\/m, \+1\.8 %\./,
    );
    const none = ranking({ result: { ...RESULT, front: [] }, runWinner: null, isSameWinner: false });
    expect(winnerWords(none, READER)).toBe('No section meets every listed check.');
  });

  it('claims to be nobody’s record', () => {
    expect(rankedClaim(ranking({ count: 1234567 }))).toBe(
      '1,234,567 sections ranked anew in 42 ms, not the run’s own record',
    );
  });

  const ranked = (more: Partial<RankedRun>): RankedRun => ({
    ...{
      asked: null,
      ranking: null,
      run: {} as Run,
      isBusy: false,
      error: null,
      retry: vi.fn(),
      isOffered: true,
    },
    ...more,
  });
  const show = (more: Partial<RankedRun>) => {
    const write = vi.fn();
    const address = { ...readRunAddress(new URLSearchParams(), view), select: vi.fn() };
    /** What is written comes back, as from the address. */
    function Page() {
      const [asked, setAsked] = useState(more.asked ?? null);
      const take = (part: Readonly<Record<string, string | null>>) => {
        write(part);
        setAsked(readRates(part.rates ?? null));
      };
      return (
        <RatesBar ranked={ranked({ ...more, asked })} address={{ ...address, write: take }} reader={READER} />
      );
    }
    render(<Page />);
    return write;
  };

  it('is labelled as not the run’s own, and one press away from it', async () => {
    const write = show({ asked: { base: 'today', changes: {} }, ranking: ranking() });
    expect(screen.getByRole('status').textContent).toContain('Ranked at the price book of today');
    expect(screen.getByRole('status').textContent).toContain('Not the run’s own record');
    expect(screen.getByText('7 in the near-best band.')).toBeTruthy();
    await userEvent.click(screen.getByRole('button', { name: 'Back to the run’s own rates' }));
    expect(write).toHaveBeenCalledWith({ rates: null });
  });

  it('is chosen in the address, as price book or by per cent', async () => {
    const write = show({});
    expect(screen.queryByRole('status')).toBeNull();
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Rates' }), 'today');
    expect(write).toHaveBeenLastCalledWith({ rates: 'today' });
    await userEvent.click(screen.getByText('Change by per cent'));
    const formwork = screen.getByLabelText(/^Formwork/);
    await userEvent.type(formwork, '-20');
    expect(write).toHaveBeenLastCalledWith({ rates: 'today;formwork:-20' });
    await userEvent.clear(formwork);
    await userEvent.type(formwork, '-200');
    expect(screen.getByText('From -90 % to 400 %')).toBeTruthy();
    expect(write).toHaveBeenLastCalledWith({ rates: 'today;formwork:-20' });
  });

  it('is not offered to who may not see rates', () => {
    show({ isOffered: false });
    expect(screen.queryByRole('combobox')).toBeNull();
  });
});

describe('the proof line of a run that took sections over', () => {
  it('says how many it took from which run, and how many it computed', () => {
    const taken = { runId: 'a', number: 3, sections: 1_968_000 };
    expect(takenClaim({ taken, sectionCount: 2_100_500 })).toBe(
      '1,968,000 sections taken from run 3, 132,500 new computed',
    );
    expect(takenClaim({ taken: null, sectionCount: 5 })).toBeNull();
  });
});
