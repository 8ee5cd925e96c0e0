/** Cases this version does not compute, and why. */
export const OUT_OF_SCOPE: Readonly<Record<string, string>> = {
  'EC2-01': 'EN 1992',
  'EC2-02': 'EN 1992',
  'EC2-03': 'EN 1992',
  'EC2-05': 'EN 1992',
  'EC2-06': 'EN 1992',
  'EC2-08': 'EN 1992',
  'EC2-09': 'EN 1992',
  'SEIS-01': 'seismic detailing',
  'SEIS-02': 'seismic detailing',
  'OPT-02': 'variables that vary without steps: a sweep takes what can be built, as OPT-01 does',
  'OPT-03': 'BS 8110',
};
