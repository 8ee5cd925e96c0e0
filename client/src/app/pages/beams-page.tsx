import { BeamsPanel } from '#client/src/features/beams/beams-panel.tsx';

export function BeamsPage() {
  return <BeamsPanel />;
}
