import { SweepsPanel } from '#client/src/features/sweeps/sweeps-panel.tsx';

export function SweepsPage() {
  return <SweepsPanel />;
}
