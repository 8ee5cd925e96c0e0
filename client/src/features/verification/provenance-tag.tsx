import { PROVENANCE_TEXT } from '#shared/verification/case-text.ts';
import type { Provenance } from '#shared/verification/published-case.ts';
import type { StateMark } from '#client/src/lib/state-labels.ts';
import { StateTag } from '#client/src/ui/state-tag.tsx';

const MARK: Readonly<Record<Provenance, StateMark>> = { read: 'full', memory: 'dashed', derived: 'half' };

/** Where a case's numbers come from: read, remembered or our own. */
export function ProvenanceTag({ provenance }: { readonly provenance: Provenance }) {
  const text = PROVENANCE_TEXT[provenance];
  return <StateTag word={text[0]!.toUpperCase() + text.slice(1)} mark={MARK[provenance]} tone="ink" />;
}
