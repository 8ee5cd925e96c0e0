export const CONCRETE_LAW_IDS = [
  'hognestad',
  'todeschini',
  'kent-park',
  'kent-park-confined',
  'mander',
  'mander-confined',
  'parabola-rectangle',
] as const;
export type ConcreteLawId = (typeof CONCRETE_LAW_IDS)[number];

export const STEEL_LAW_IDS = ['elastic-plastic', 'strain-hardening'] as const;
export type SteelLawId = (typeof STEEL_LAW_IDS)[number];

/** The laws a curve is drawn by. What is left out takes its law's own value. */
export interface CurveChoices {
  readonly concreteLaw: ConcreteLawId;
  readonly steelLaw: SteelLawId;
  /** Peak stress of unconfined concrete over f′c. */
  readonly peakShare?: number | undefined;
  readonly peakStrain?: number | undefined;
  /** Crushing strain of the extreme fibre, or of the core's edge for a confined law. */
  readonly crushingStrain?: number | undefined;
  /** Strain at which a bar breaks. */
  readonly ruptureStrain?: number | undefined;
  /** fu over fy of the hardening branch. */
  readonly strengthRatio?: number | undefined;
  /** Strain at which hardening begins. */
  readonly hardeningStrain?: number | undefined;
  /** Yield strength of the hoops, MPa; that of the stirrups unless set. */
  readonly hoopYieldMPa?: number | undefined;
  /** Strain at which a hoop breaks; 0.12 unless set. */
  readonly hoopRuptureStrain?: number | undefined;
  /** Draw concrete's tension, linear to fr, up to the first crack. */
  readonly hasTensionBeforeCracking?: boolean | undefined;
}
