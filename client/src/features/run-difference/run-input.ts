export const INPUT_GROUPS = ['Ranges', 'Demand', 'Rules', 'Design basis', 'Rates', 'How it ran'] as const;
export type InputGroup = (typeof INPUT_GROUPS)[number];

/** One thing that went into a run, as it prints. */
export interface RunInput {
  readonly group: InputGroup;
  readonly label: string;
  /** As stored: two runs differ where this does, however they print. */
  readonly stored: unknown;
  readonly text: string;
}
