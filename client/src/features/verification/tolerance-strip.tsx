import type { Comparison } from '#shared/verification/comparison.ts';

const HEIGHT = 18;

/** How much of what is allowed a value's difference takes up: 0 is the printed value, 1 the limit. */
function shareOfAllowed({ allowed, printed, computed, relative }: Comparison): number | null {
  if (allowed.kind === 'below') return null;
  return (allowed.kind === 'absolute' ? Math.abs(computed - printed) : relative) / allowed.by;
}

/** Every value as a tick on a rule from no difference to the limit; the limit is the heavy tick at the end. */
export function ToleranceStrip({ comparisons }: { readonly comparisons: readonly Comparison[] }) {
  const shares = comparisons.flatMap((comparison) => shareOfAllowed(comparison) ?? []);
  if (shares.length === 0) return null;
  const x = (share: number) => `${Math.min(1, share) * 97 + 1}%`;
  return (
    <svg width="100%" height={HEIGHT} aria-hidden="true" className="block">
      <line x1="1%" x2="98%" y1={HEIGHT - 1} y2={HEIGHT - 1} stroke="var(--concrete-edge)" />
      {shares.map((share, i) => (
        <line
          key={i}
          x1={x(share)}
          x2={x(share)}
          y1={5}
          y2={HEIGHT - 1}
          stroke={share > 1 ? 'var(--fails)' : 'var(--ink)'}
          strokeOpacity={0.45}
        />
      ))}
      <line x1="98%" x2="98%" y1={1} y2={HEIGHT} stroke="var(--ink)" strokeWidth={2} />
    </svg>
  );
}
