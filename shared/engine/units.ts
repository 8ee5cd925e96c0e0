/**
 * Exact conversion factors between US customary and SI units.
 *
 * The inch and the pound-mass are exact by definition (international yard and pound agreement, 1959); the pound-force
 * follows from standard gravity 9.80665 m/s² (ISO 80000-3). Inside the engine everything is N, mm, MPa, kg, rad/mm.
 */
export const MM_PER_IN = 25.4;
export const MM_PER_FT = 304.8;
export const KG_PER_LB = 0.45359237;
const N_PER_LBF = 4.4482216152605;
export const N_PER_KIP = 1000 * N_PER_LBF;
export const MPA_PER_PSI = N_PER_LBF / (MM_PER_IN * MM_PER_IN);
export const MPA_PER_KSI = 1000 * MPA_PER_PSI;
export const MM2_PER_IN2 = MM_PER_IN * MM_PER_IN;
export const NMM_PER_KIPFT = N_PER_KIP * MM_PER_FT;
export const NMM_PER_KNM = 1e6;
export const KG_PER_M_PER_LB_PER_FT = KG_PER_LB / 0.3048;
export const KG_PER_TONNE = 1000;
