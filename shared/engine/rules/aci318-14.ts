import { aci318 } from './aci318.ts';

export const ACI_318_14 = aci318({ id: 'aci318-14', year: '14', isMetric: false });
