import type { CandidateState, Role } from '#shared/contract/records.ts';

interface DemoStep {
  readonly to: CandidateState;
  readonly by: Role;
  readonly note: string;
  /** Days after the pin. */
  readonly after: number;
}
interface DemoComment {
  readonly by: Role;
  readonly text: string;
  readonly after: number;
}

/** A pin of the demo: the section at that share of the way along a run's front, from its best leading measure. */
export interface DemoCandidate {
  readonly sweep: string;
  readonly alongFront: number;
  /** Days after the demo's first day. */
  readonly day: number;
  readonly note: string;
  readonly steps: readonly DemoStep[];
  readonly comments: readonly DemoComment[];
}

const CHECKED = {
  to: 'checked',
  by: 'checker',
  note: 'Worked by hand with three figures, displaced concrete left out: strength within 1 %. Where c and the curvatures differ by more, that is the displaced concrete',
} as const;

export const DEMO_CANDIDATES: readonly DemoCandidate[] = [
  {
    sweep: 'reading-room',
    alongFront: 0,
    day: 3,
    note: 'Least steel of all, as deep as the cap allows',
    steps: [
      {
        to: 'superseded',
        by: 'engineer',
        note: 'The ducts take the depth; the shallower one goes forward',
        after: 3,
      },
    ],
    comments: [{ by: 'estimator', text: 'Cheapest steel, but the deep sides cost forms.', after: 1 }],
  },
  {
    sweep: 'reading-room',
    alongFront: 0.5,
    day: 4,
    note: 'Three inches shallower for little steel',
    steps: [
      { ...CHECKED, after: 2 },
      { to: 'approved', by: 'checker', note: 'Approved for the tender issue', after: 4 },
    ],
    comments: [
      { by: 'checker', text: 'Which edge of the slab is formed? I took 5 in off each side.', after: 1 },
      { by: 'engineer', text: 'Both: the slab runs through on this grid.', after: 1 },
    ],
  },
  {
    sweep: 'reading-room-fine',
    alongFront: 0.3,
    day: 5,
    note: 'Best cost of the fine sweep at this depth',
    steps: [{ ...CHECKED, after: 2 }],
    comments: [{ by: 'estimator', text: 'Odd widths need made-up forms; six uses at least.', after: 1 }],
  },
  {
    sweep: 'stacks',
    alongFront: 0,
    day: 6,
    note: 'Cheapest for the stacks',
    steps: [
      {
        to: 'returned',
        by: 'checker',
        note: 'The stacks may be loaded with compact shelving: confirm Mu before I look further',
        after: 2,
      },
    ],
    comments: [],
  },
  {
    sweep: 'roof',
    alongFront: 0.5,
    day: 7,
    note: 'Same width as the columns below',
    steps: [],
    comments: [],
  },
  {
    sweep: 'ground-floor',
    alongFront: 0.2,
    day: 13,
    note: 'Keeps the corridor ceiling',
    steps: [{ ...CHECKED, after: 2 }],
    comments: [],
  },
  {
    sweep: 'plant-room',
    alongFront: 0,
    day: 8,
    note: 'Cheapest with the slab worked in',
    steps: [],
    comments: [
      { by: 'checker', text: 'Openings for ducts cut the slab on grid 4: is bf the same there?', after: 1 },
    ],
  },
  {
    sweep: 'plant-room',
    alongFront: 0.5,
    day: 8,
    note: 'Four and a half inches shallower, for the ducts under it',
    steps: [],
    comments: [],
  },
  {
    sweep: 'arcade-columns',
    alongFront: 0.34,
    day: 16,
    note: 'Bars in one layer, and little more steel than the least',
    steps: [{ ...CHECKED, after: 2 }],
    comments: [{ by: 'checker', text: 'Bars within the web only; the slab’s own run on top.', after: 1 }],
  },
  {
    sweep: 'arcade-columns',
    alongFront: 0,
    day: 16,
    note: 'Least steel at the columns, as deep as the arcade’s ceiling allows',
    steps: [],
    comments: [],
  },
];
