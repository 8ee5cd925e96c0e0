import type { CaseOutOfScope } from '#shared/verification/book.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { ProvenanceTag } from './provenance-tag.tsx';

/** Cases that are kept but not computed by this engine, and why. */
export function OutOfScopeTable({ cases }: { readonly cases: readonly CaseOutOfScope[] }) {
  return (
    <TableFrame label="Cases not computed" minWidth="44rem">
      <thead>
        <tr>
          <th scope="col">Case</th>
          <th scope="col">Source</th>
          <th scope="col">Provenance</th>
          <th scope="col">Why it is not computed</th>
        </tr>
      </thead>
      <tbody>
        {cases.map(({ published, reason }) => (
          <tr key={published.id} className="middle">
            <th scope="row">
              <span className="num whitespace-nowrap">{published.id}</span>
              <span className="block text-2xs font-normal text-muted">{published.topic}</span>
            </th>
            <td>{published.source}</td>
            <td>
              <ProvenanceTag provenance={published.provenance} />
            </td>
            <td>{reason}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
