import { formatNumber } from '#shared/print/format-quantity.ts';
import type { ShownCandidate } from './comparison.ts';
import { priceFlips, type FlipMaterial, type PriceFlip } from './price-flips.ts';

const RATE: Readonly<Record<FlipMaterial, string>> = {
  steel: 'the steel rates',
  concrete: 'the concrete rates',
  formwork: 'the formwork rate',
};
/** More than these nobody weighs at once. */
const MOST_TOLD = 4;

function flipText({ challenger, material, factor }: PriceFlip): string {
  const percent = formatNumber(Math.abs(factor - 1) * 100, 2, true);
  return `${challenger}, once ${RATE[material]} are ${percent} % ${factor > 1 ? 'higher' : 'lower'} than now`.replace(
    'rate are',
    'rate is',
  );
}

/** At which change of a rate another candidate would be the cheapest. */
export function PriceFlipNote({ candidates }: { readonly candidates: readonly ShownCandidate[] }) {
  const flips = priceFlips(candidates);
  if (flips.length === 0) return null;
  return (
    <section className="mt-5 max-w-prose text-sm" aria-label="What would change the cheapest">
      <p>
        <span className="font-medium">{flips[0]!.cheapest} is the cheapest now.</span> It would be beaten by
      </p>
      <ul className="mt-1 grid gap-0.5">
        {flips.slice(0, MOST_TOLD).map((flip) => (
          <li key={`${flip.challenger} ${flip.material}`} className="border-t border-rule py-1">
            {flipText(flip)}.
          </li>
        ))}
      </ul>
    </section>
  );
}
