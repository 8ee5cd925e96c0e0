/** What ends a curve: crushing of the extreme fibre or of the core's edge, a bar that breaks, 20 % lost from the peak. */
export type UltimateCause = 'concrete-crushing' | 'core-crushing' | 'bar-rupture' | 'moment-drop';
