/** Which way a difference goes, by shape and word. */
export function VerdictText({ verdict }: { readonly verdict: 'better' | 'worse' | 'same' | null }) {
  if (verdict === null || verdict === 'same') return null;
  return verdict === 'better' ? (
    <span className="text-xs font-semibold text-meets">◆ better</span>
  ) : (
    <span className="text-xs font-semibold text-fails">▽ worse</span>
  );
}
