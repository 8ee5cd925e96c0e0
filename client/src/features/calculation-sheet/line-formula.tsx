import { lazy, Suspense } from 'react';
import { formulaTex } from '#shared/sheet/formula-tex.ts';
import type { WorkingLine } from '#shared/sheet/sheet.ts';
import { textRuns } from '#shared/sheet/text-runs.ts';
import { SymbolText } from './symbol-text.tsx';

// The setter and its fonts come after the sheet, which can be read without them.
const SetFormula = lazy(() => import('./set-formula.tsx'));

const RELATION_TEX: Readonly<Record<WorkingLine['relation'], string>> = {
  '=': '=',
  from: '\\ \\text{from}\\ ',
  ':': '',
};

export function LineFormula({ line }: { readonly line: WorkingLine }) {
  const { symbol, relation, expression, remark } = line;
  const plain = [symbol, relation, expression].join(' ').replace(' :', ':');
  const tex = `${formulaTex(symbol)}${RELATION_TEX[relation]}${formulaTex(expression)}`;
  return (
    <>
      <Suspense fallback={<SymbolText runs={textRuns(plain, { isProse: false })} />}>
        <SetFormula tex={tex} />
      </Suspense>
      {remark !== '' && (
        <span className="block text-2xs text-muted print:ml-2 print:inline">
          <SymbolText runs={textRuns(remark, { isProse: true })} />
        </span>
      )}
    </>
  );
}
