/** Lines where the text will stand, as tall as the text, so that nothing moves when it arrives. */
export function Skeleton({
  lines = 3,
  className = '',
}: {
  readonly lines?: number;
  readonly className?: string;
}) {
  return (
    <div role="status" className={`grid gap-3 ${className}`}>
      <span className="sr-only">Loading</span>
      {Array.from({ length: lines }, (_, i) => (
        <span
          key={i}
          aria-hidden="true"
          className="block h-5 animate-pulse border-b border-rule bg-concrete/60"
          style={{ width: `${[96, 82, 90, 74][i % 4]}%` }}
        />
      ))}
    </div>
  );
}
