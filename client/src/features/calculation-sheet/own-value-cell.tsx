import { useState } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { SheetValue } from '#shared/contract/records.ts';
import { ownValueTexts, type OwnValueText } from '#shared/sheet/own-value.ts';
import type { NumberedLine } from '#shared/sheet/sheet.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { useSetSheetValue } from './api.ts';

/** Whose sheet it is, who reads it and what was written on it. */
export interface SheetReading {
  readonly candidateId: string;
  readonly units: UnitSystem;
  readonly readerId: string;
  readonly values: readonly SheetValue[];
  readonly mayWrite: boolean;
}

/** What checkers got for a line, beside the sheet's; a field for the checker who reads it. */
export function OwnValueCell({
  line,
  reading,
}: {
  readonly line: NumberedLine;
  readonly reading: SheetReading;
}) {
  const { values, units, readerId, mayWrite } = reading;
  if (line.value === null) return null;
  const own = values.find((value) => value.line === line.id && value.by.id === readerId);
  const shown = ownValueTexts(values, line, units);
  if (!mayWrite && shown.length === 0)
    return <span className="hidden h-3 border-b border-ink print:block" aria-hidden="true" />;
  return (
    <>
      {mayWrite && <OwnValueField line={line} reading={reading} saved={own?.value ?? null} />}
      {shown.map((text) => (
        <Compared key={text.by} text={text} isAmountShown={!mayWrite || text.by !== own?.by.name} />
      ))}
    </>
  );
}

function Compared({ text, isAmountShown }: { readonly text: OwnValueText; readonly isAmountShown: boolean }) {
  const { amount, difference, meets, word, by } = text;
  return (
    <span className="block" title={by}>
      {isAmountShown && <span className="num block">{amount}</span>}
      <span className={`block text-2xs font-medium ${meets ? 'text-meets' : 'text-fails'}`}>
        <span aria-hidden="true">{meets ? '✓' : '≠'}</span> {word} {difference}
      </span>
    </span>
  );
}

interface OwnValueFieldProps {
  readonly line: NumberedLine;
  readonly reading: SheetReading;
  readonly saved: number | null;
}

/** Kept when the field is left, or with Enter; what cannot be read stays with its message. */
function OwnValueField({ line, reading, saved }: OwnValueFieldProps) {
  const save = useSetSheetValue(reading.candidateId);
  const [typed, setTyped] = useState<number | null>(saved);
  const [kept, setKept] = useState<number | null>(saved);
  const keep = () => {
    if (Object.is(typed, kept) || Number.isNaN(typed)) return;
    setKept(typed);
    save.mutate({ line: line.id, value: typed }, { onError: () => setKept(saved) });
  };
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        keep();
      }}
    >
      <NumberField
        label={`Own value for line ${line.number}`}
        isLabelHidden
        kind={line.kind}
        units={reading.units}
        unitText=""
        value={typed}
        onChange={setTyped}
        onBlur={keep}
        error={save.isError ? messageOf(save.error) : undefined}
      />
    </form>
  );
}
