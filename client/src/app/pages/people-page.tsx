import { MembersPanel } from '#client/src/features/members/members-panel.tsx';

export function PeoplePage() {
  return <MembersPanel />;
}
