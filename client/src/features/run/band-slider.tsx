import { useId } from 'react';
import { formatNumber } from '#shared/print/format-quantity.ts';
import { WIDEST_BAND_SHARE } from './run-address.ts';

interface BandSliderProps {
  readonly share: number;
  /** How many sections lie in it, in words. */
  readonly count: string;
  readonly onChange: (share: number) => void;
}

/** How far from the best a section may lie and still count as near it. */
export function BandSlider({ share, count, onChange }: BandSliderProps) {
  const id = useId();
  return (
    <span className="ml-auto flex items-center gap-2 text-sm text-muted">
      <label htmlFor={id}>Near-best band</label>
      <input
        id={id}
        type="range"
        min={0}
        max={WIDEST_BAND_SHARE * 100}
        step={0.5}
        value={share * 100}
        aria-valuetext={`${share * 100} %, ${count}`}
        onChange={(event) => onChange(Number(event.target.value) / 100)}
        className="w-24 accent-[var(--near-mark)]"
      />
      <span className="num w-28 whitespace-nowrap">
        {formatNumber(share * 100, 3, true)} %, {count}
      </span>
    </span>
  );
}
