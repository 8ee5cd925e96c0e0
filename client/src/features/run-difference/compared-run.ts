import type { Run } from '#shared/contract/records.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import type { JudgedSections } from './front-differences.ts';

/** A run with what it found in the measures compared, and its sections. */
export interface ComparedRun {
  readonly run: Run;
  readonly result: ViewResult;
  readonly sections: JudgedSections;
}

/** The baseline, and what is set against it. */
export interface ComparedRuns {
  readonly baseline: ComparedRun;
  readonly other: ComparedRun;
}
