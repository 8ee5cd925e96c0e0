/** Cases this version does not compute, and why. */
export const OUT_OF_SCOPE: Readonly<Record<string, string>> = {
  'OPT-02': 'variables that vary without steps: a sweep takes what can be built, as OPT-01 does',
  'OPT-03': 'BS 8110',
};
