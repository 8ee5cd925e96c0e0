import type { Candidate, Person, SharedShortlist, SheetValue, Snapshot } from '#shared/contract/records.ts';
import { takeoff } from '#shared/engine/takeoff.ts';
import { isMoneyLine } from '#shared/sheet/quantity-table.ts';
import { hideCosts } from '../../http/hide-costs.ts';
import { canSeeRates } from '../../http/project-access.ts';
import { allowedTransitions } from './policy.ts';
import type { CandidateRecord } from './queries.ts';
import { isReproduced } from './snapshot.ts';

type SharedCandidate = SharedShortlist['candidates'][number];

export function presentCandidate(record: CandidateRecord, reader: Person): Candidate {
  return {
    ...presentSection(record, canSeeRates(reader)),
    comments: record.comments.map(({ id, by, text, createdAt }) => ({
      id,
      author: by,
      text,
      createdAt: createdAt.toISOString(),
    })),
    transitions: record.transitions.map(({ id, from, to, by, note, sheetValues, createdAt }) => ({
      id,
      from,
      to,
      by,
      note,
      sheetValues: sheetValues && presentSheetValues(sheetValues, reader),
      createdAt: createdAt.toISOString(),
    })),
    allowedTransitions: allowedTransitions(record.candidate, reader),
  };
}

/** Own values for lines in money say what the rates are, so they go where rates go. */
export const presentSheetValues = (values: readonly SheetValue[], reader: Person): SheetValue[] =>
  values.filter(({ line }) => canSeeRates(reader) || !isMoneyLine(line));

/** For whoever has a link: no rates, nothing of who said what to whom. */
export const presentSharedCandidate = (record: CandidateRecord): SharedCandidate =>
  presentSection(record, false);

function presentSection({ candidate, beam, author }: CandidateRecord, hasRates: boolean): SharedCandidate {
  const snapshot = hasRates ? candidate.snapshot : hideRates(candidate.snapshot);
  const { lines, ...amounts } = takeoff(snapshot.evaluation.quantities, beam.spanMm, beam.count);
  return {
    id: candidate.id,
    projectId: candidate.projectId,
    beam: {
      id: beam.id,
      mark: beam.mark,
      location: beam.location,
      spanMm: beam.spanMm,
      count: beam.count,
    },
    label: candidate.label,
    state: candidate.state,
    note: candidate.note,
    author: { id: author.id, name: author.name },
    runId: candidate.runId,
    sectionIndex: candidate.sectionIndex,
    snapshot,
    hash: candidate.hash,
    isReproducedByCurrentEngine: isReproduced(candidate.snapshot),
    takeoff: { ...amounts, lines: [...lines] },
    createdAt: candidate.createdAt.toISOString(),
  };
}

function hideRates(snapshot: Snapshot): Snapshot {
  return {
    ...snapshot,
    basis: { ...snapshot.basis, rates: null },
    evaluation: hideCosts(snapshot.evaluation),
  };
}
