import { engineBasisSchema, ratesSchema } from '#shared/contract/design-basis.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import type { ProjectRow } from './project-access.ts';

/** What decides numbers, copied from the project as it stands: the engine's part of the basis, and the rates. */
export function frozenBasis({
  designBasis,
  priceBook,
}: Pick<ProjectRow, 'designBasis' | 'priceBook'>): DesignBasis {
  return {
    ...engineBasisSchema.parse(designBasis),
    rates: priceBook === null ? null : ratesSchema.parse(priceBook),
  };
}
