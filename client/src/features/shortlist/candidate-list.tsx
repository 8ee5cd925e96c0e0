import { Link } from 'react-router-dom';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Candidate } from '#shared/contract/records.ts';
import { SectionDrawing } from '#client/src/drawing/section-drawing.tsx';
import { formatMoney, formatQuantity } from '#shared/print/format-quantity.ts';
import { paths } from '#client/src/lib/paths.ts';
import { sizeText, steelText } from '#shared/print/section-text.ts';
import { candidateStateLabel } from '#client/src/lib/state-labels.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { unitLabel } from '#shared/print/units.ts';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { CandidateFlag } from './candidate-flag.tsx';
import { COMPARE_MAX } from './selection.ts';

/** Height of the tallest drawing in the list, px; all stand to one scale. */
const DRAWING_PX = 56;

/** Compare, candidate, section, state, steel, in all, (cost), μφ, Mu/φMn, author. */
const SHARES = [7, 8, 29, 12, 9, 9, 7, 8, 11];
const SHARES_WITH_MONEY = [7, 8, 25, 11, 8, 8, 11, 6, 7, 9];

interface CandidateListProps {
  readonly candidates: readonly Candidate[];
  readonly units: UnitSystem;
  readonly selected: readonly string[];
  readonly onToggle: (id: string) => void;
  /** Overall depth that fills the drawings' height, mm. */
  readonly tallestMm: number;
  readonly hasMoney: boolean;
}

/** The candidates of one beam. */
export function CandidateList(props: CandidateListProps) {
  const { candidates, units, selected, onToggle, tallestMm, hasMoney } = props;
  const symbols = codeSymbols(candidates[0]!.snapshot.basis.ruleSet);
  const { beam } = candidates[0]!;
  return (
    <TableFrame
      label={`Candidates for ${beam.mark}`}
      columnShares={hasMoney ? SHARES_WITH_MONEY : SHARES}
      minWidth="60rem"
    >
      <thead>
        <tr>
          <th scope="col">Compare</th>
          <th scope="col">Candidate</th>
          <th scope="col">Section</th>
          <th scope="col">State</th>
          <th scope="col" className="figure">
            Steel, {unitLabel('mass-per-length', units)}
          </th>
          <th scope="col" className="figure">
            In all, {unitLabel('tonnes', units)}
          </th>
          {hasMoney && (
            <th scope="col" className="figure">
              Cost
            </th>
          )}
          <th scope="col" className="figure">
            μφ
          </th>
          <th scope="col" className="figure">
            {symbols.moment}/{symbols.designMoment}
          </th>
          <th scope="col" className="pl-4!">
            Author
          </th>
        </tr>
      </thead>
      <tbody>
        {candidates.map((candidate) => (
          <CandidateRow
            key={candidate.id}
            candidate={candidate}
            units={units}
            hasMoney={hasMoney}
            pxPerMm={DRAWING_PX / tallestMm}
            isSelected={selected.includes(candidate.id)}
            isFull={selected.length >= COMPARE_MAX}
            onToggle={() => onToggle(candidate.id)}
          />
        ))}
      </tbody>
    </TableFrame>
  );
}

interface CandidateRowProps {
  readonly candidate: Candidate;
  readonly units: UnitSystem;
  readonly hasMoney: boolean;
  readonly pxPerMm: number;
  readonly isSelected: boolean;
  readonly isFull: boolean;
  readonly onToggle: () => void;
}

function CandidateRow(props: CandidateRowProps) {
  const { candidate, units, hasMoney, pxPerMm, isSelected, isFull, onToggle } = props;
  const { section, evaluation, basis } = candidate.snapshot;
  const { measures, quantities } = evaluation;
  return (
    <tr className="middle hover:bg-sheet">
      <td>
        <CheckboxField
          label={`Compare ${candidate.label}`}
          isLabelHidden
          checked={isSelected}
          disabled={isFull && !isSelected}
          onChange={onToggle}
        />
      </td>
      <th scope="row">
        <Link
          to={paths.candidate(candidate.projectId, candidate.id)}
          aria-label={`Candidate ${candidate.label}`}
          className="inline-block hover:opacity-80"
        >
          <CandidateFlag label={candidate.label} />
        </Link>
      </th>
      <td>
        <span className="flex items-end gap-3">
          <span className="flex w-12 shrink-0 justify-center border-b border-ink">
            <SectionDrawing
              variant="strip"
              section={section}
              evaluation={evaluation}
              standard={basis.barStandard}
              units={units}
              pxPerMm={pxPerMm}
              heightPx={DRAWING_PX}
            />
          </span>
          <span>
            <span className="num block font-medium">{sizeText(section, units)}</span>
            <span className="num block text-steel">{steelText(section, units)}</span>
          </span>
        </span>
      </td>
      <td>
        <StateTag {...candidateStateLabel(candidate.state)} />
      </td>
      <td className="figure">
        {formatQuantity(measures.steelKgPerM, 'mass-per-length', units, { hideUnit: true })}
      </td>
      <td className="figure">
        {formatQuantity(candidate.takeoff.totalTonnes, 'tonnes', units, { hideUnit: true })}
      </td>
      {hasMoney && (
        <td className="figure">
          {formatMoney(measures.costPerM, quantities.cost?.currency, 'money-per-length', units)}
        </td>
      )}
      <td className="figure">{formatQuantity(measures.curvatureDuctility, 'ratio', units)}</td>
      <td className="figure">{formatQuantity(measures.utilisation, 'ratio', units)}</td>
      <td className="pl-4! text-muted">{candidate.author.name}</td>
    </tr>
  );
}
