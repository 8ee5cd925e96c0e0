/** What no check of this engine version covers; shown wherever results are shown. */
export const NOT_CHECKED: readonly string[] = [
  'whether Mu includes the self-weight of this section',
  'sections elsewhere along the span',
  'limits of the code on f′c, fy, cover and lightweight concrete (normalweight is assumed)',
  'shear and stirrup design (stirrups are taken at the spacing given)',
  'torsion',
  'crack width and spacing of bars for crack control',
  'deflection, short and long term',
  'anchorage, development and lap lengths',
  'ties for compression bars and skin reinforcement',
  'seismic detailing',
  'axial force and biaxial bending',
  'lateral stability',
  'fire resistance and durability',
];
