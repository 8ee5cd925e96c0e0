/** The name and three bars in section. */
export function Wordmark({ isLarge = false }: { readonly isLarge?: boolean }) {
  const dot = isLarge ? 'size-4 ml-1.5' : 'size-[9px] ml-[3px]';
  return (
    <span
      className={`inline-flex items-baseline font-bold tracking-[0.01em] whitespace-nowrap [font-stretch:118%] ${isLarge ? 'text-3xl' : 'text-lg'}`}
    >
      Fairweight
      <span className="inline-flex pl-0.5" aria-hidden="true">
        <i className={`${dot} rounded-[50%] bg-steel-solid`} />
        <i className={`${dot} rounded-[50%] bg-steel-solid`} />
        <i className={`${dot} rounded-[50%] bg-steel-solid`} />
      </span>
    </span>
  );
}
