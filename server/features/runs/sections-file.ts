import type { Router } from 'express';
import {
  byIdAndFormat,
  MOST_ROWS_IN_FILE,
  SECTIONS_FILE_PATH,
  sectionsFileQuerySchema,
} from '#shared/contract/endpoints/file-endpoints.ts';
import type { Person } from '#shared/contract/records.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { fileName } from '#shared/print/file-name.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { bandWithin } from '#shared/sweep/band-within.ts';
import { hasFilters } from '#shared/sweep/range-filters.ts';
import { isSameView, viewOf as namedView, type View } from '#shared/sweep/problem.ts';
import { methodOf } from '#shared/sweep/run-method.ts';
import type { Database } from '../../db/client.ts';
import type { Deps } from '../../deps.ts';
import { conflict, forbidden, invalidInput, tooManySections } from '../../errors.ts';
import { canSeeRates } from '../../http/project-access.ts';
import { sendExport } from '../../http/send-export.ts';
import { requireSignedInPerson } from '../../http/signed-in-person.ts';
import { requireValidBody, requireValidParams } from '../../http/validate.ts';
import { canSeeView } from './policy.ts';
import { listViews, requireRun, requireView, type RunRecord, type ViewRow } from './queries.ts';
import { sectionsFileHead, type SectionsAsked } from './sections-file-head.ts';

/** Sections of a run as a file, for whoever may read the run and with what that reader is shown of it. */
export function registerSectionsFile(router: Router, deps: Deps): void {
  router.get(SECTIONS_FILE_PATH, async (req, res) => {
    const { db } = deps;
    const person = await requireSignedInPerson(db, req);
    const { id, format } = requireValidParams(byIdAndFormat, req.params);
    const query = requireValidBody(sectionsFileQuerySchema, req.query);
    const record = await requireRun(db, person, id);
    const { list, f: filters, band } = query;
    const asked = { list, filters, bandShare: band / 100, view: viewOf(query, record) };
    const view = await readView(db, person, record, asked);
    const { run, beam, project } = record;
    const { space, demand, rules } = run.definition;
    const isMoneyShown = canSeeRates(person);
    const reader = {
      units: project.designBasis.units,
      currency: isMoneyShown ? (run.basis.rates?.currency ?? null) : null,
      code: run.basis.ruleSet,
    };
    await sendExport(deps, res, {
      order: {
        kind: 'sections',
        request: {
          query: {
            ...asked,
            problem: { space, demand, rules, basis: run.basis },
            most: MOST_ROWS_IN_FILE,
          },
          known: knownSections(view, asked),
          reader,
          isMoneyShown,
          head: sectionsFileHead(record, view, { ...asked, reader }),
          format,
        },
      },
      fileName: fileName([project.number, beam.mark, 'run', run.number, list], format),
      refusal: tooManyRows,
    });
  });
}

function viewOf({ x, y, z }: Partial<View>, { run }: RunRecord): View {
  if (x === undefined && y === undefined) return run.definition.view;
  if (x === undefined || y === undefined || x === y)
    throw invalidInput([{ path: ['y'], message: 'Give two different measures, x and y' }]);
  if (z === x || z === y)
    throw invalidInput([{ path: ['z'], message: 'Give a third measure beside x and y, or none' }]);
  return namedView({ x, y, z });
}

/** The view as the run keeps it, where the reader may see what is asked of it and it can be had. */
async function readView(
  db: Database,
  person: Person,
  record: RunRecord,
  asked: SectionsAsked,
): Promise<ViewRow> {
  const { run } = record;
  // A range on the cost would tell the cost, section by section.
  if (!canSeeView(person, asked.view) || (asked.filters.costPerM !== undefined && !canSeeRates(person)))
    throw forbidden(`Your role (${person.role}) may not see costs`);
  const kept = (await listViews(db, run.id)).find((one) => isSameView(one, asked.view));
  if (kept === undefined)
    throw conflict('Nobody has opened this comparison yet: open it on the run’s page first');
  const view = await requireView(db, person, { runId: run.id, viewId: kept.id });
  if (view.result === null)
    throw conflict('The run has no sections to hand over yet: try again when it has ended');
  if (knownSections(view, asked) === null) requireSweepable(record, view);
  return view;
}

/** What the result names itself; null where the sections have to be found again. */
function knownSections({ result }: ViewRow, { view, list, filters, bandShare }: SectionsAsked) {
  if (result === null || list === 'all' || hasFilters(filters)) return null;
  const { frontInThree } = result;
  // The view does not name them all.
  if (list === 'front' && view.z && frontInThree?.count !== frontInThree?.points.length) return null;
  if (list === 'front')
    return (frontInThree?.points ?? result.front).map(({ index, tieCount }) => ({ index, tieCount }));
  const band = bandWithin(result, bandShare);
  if (result.isBandCut && band.length === result.band.length) return null;
  return band.map(({ index }) => ({ index, tieCount: 1 }));
}

/** Sections are found by judging the space again, which gives the run's own only where it was judged whole by this engine. */
function requireSweepable({ run }: RunRecord, view: ViewRow): void {
  if (view.state !== 'finished')
    throw conflict(
      'The run did not evaluate every section: only its front and band as they stand can be handed over',
    );
  if (methodOf(run.definition, run.basis) === 'bounds')
    throw conflict(
      'This run was searched by bounds, not section by section: only its front can be handed over',
    );
  if (run.engineVersion !== ENGINE_VERSION)
    throw conflict(
      `The run was made by engine ${run.engineVersion} and this is ${ENGINE_VERSION}: run the sweep again to hand over more than its front`,
    );
}

function tooManyRows(count: number) {
  const message = `${formatWhole(count)} sections are more than the ${formatWhole(MOST_ROWS_IN_FILE)} that one file takes. Set a range on the run and export again.`;
  return tooManySections(message, [{ path: ['f'], message }]);
}
