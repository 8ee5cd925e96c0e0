/** The candidate's letter on a pennant, as on the chart. */
export function CandidateFlag({
  label,
  isLarge = false,
}: {
  readonly label: string;
  readonly isLarge?: boolean;
}) {
  return (
    <span
      className={`inline-block bg-steel-solid text-center font-mono font-semibold text-on-solid [clip-path:polygon(0_0,100%_0,84%_50%,100%_100%,0_100%)] ${
        isLarge ? 'min-w-12 py-1 pr-3 pl-2 text-xl' : 'min-w-8 py-px pr-2.5 pl-1.5 text-sm'
      }`}
    >
      {label}
    </span>
  );
}
