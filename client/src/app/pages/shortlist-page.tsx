import { ShortlistPanel } from '#client/src/features/shortlist/shortlist-panel.tsx';

export function ShortlistPage() {
  return <ShortlistPanel />;
}
