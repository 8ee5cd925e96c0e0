import type { Role } from '#shared/contract/records.ts';
import type { ViewAddress } from '#shared/contract/saved-view.ts';
import { MM_PER_IN } from '#shared/engine/units.ts';

/** A way of looking at a demo run that somebody of the office kept. */
export interface DemoView {
  readonly sweep: string;
  readonly name: string;
  readonly by: Role;
  /** Days after the demo's first day. */
  readonly day: number;
  readonly address: ViewAddress;
}

export const DEMO_VIEWS: readonly DemoView[] = [
  {
    sweep: 'reading-room',
    name: 'Cost under a 23 in ceiling',
    by: 'engineer',
    day: 4,
    address: { x: 'costPerM', y: 'depthMm', f: `depthMm:~${23 * MM_PER_IN}`, by: 'barCount', band: '5' },
  },
  {
    sweep: 'reading-room',
    name: 'What ductility asks in steel',
    by: 'checker',
    day: 6,
    address: { x: 'steelKgPerM', y: 'curvatureDuctility', by: 'depthMm', band: '5' },
  },
];
