import { EMPTY_PRICE_BOOK } from '#client/src/features/price-book/empty-price-book.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { PriceBookForm } from '#client/src/features/price-book/price-book-form.tsx';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';

export function PricesPage() {
  const project = useProject();
  const mayEdit = useMay('edit-price-book');
  const maySee = useMay('see-rates');
  if (!maySee)
    return <EmptyState title="Rates are not shown to viewers">Quantities are on the shortlist.</EmptyState>;
  if (project.priceBook === null && !mayEdit)
    return (
      <EmptyState title="No rates yet">
        An estimator of the project enters them. Until then costs and carbon stay blank.
      </EmptyState>
    );
  return (
    <PriceBookForm
      projectId={project.id}
      priceBook={project.priceBook ?? EMPTY_PRICE_BOOK}
      units={project.designBasis.units}
      fcSymbol={codeSymbols(project.designBasis.ruleSet).fc}
      isReadOnly={!mayEdit}
    />
  );
}
