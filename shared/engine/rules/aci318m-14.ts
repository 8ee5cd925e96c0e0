import { aci318 } from './aci318.ts';

export const ACI_318M_14 = aci318({ id: 'aci318m-14', year: '14', isMetric: true });
