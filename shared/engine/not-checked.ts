/** What no check of this engine version covers; shown wherever results are shown. */
export const NOT_CHECKED: readonly string[] = [
  'whether Mu includes the self-weight of this section',
  'sections elsewhere along the span',
  'limits of the code on f′c, fy, cover and lightweight concrete (normalweight is assumed)',
  'shear where no Vu is given, and stirrup spacing along the span',
  'torsion',
  'crack width (the spacing of the bars is checked)',
  'deflection, short and long term (least depth only, where span and support are given)',
  'anchorage, development and lap lengths',
  'skin reinforcement of deep beams',
  'seismic detailing',
  'axial force and biaxial bending',
  'lateral stability',
  'fire resistance and durability',
];
