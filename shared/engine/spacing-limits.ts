/** What may bound the spacing of stirrups, in the order it is worked out; `given` is the widest allowed by the engineer. */
export const SPACING_LIMITS = [
  'given',
  'shear-strength',
  'along',
  'least-area',
  'ties',
  'least-side',
  'hoops-depth',
  'hoops-bars',
] as const;
export type SpacingLimit = (typeof SPACING_LIMITS)[number];
