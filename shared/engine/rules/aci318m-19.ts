import { aci318 } from './aci318.ts';

export const ACI_318M_19 = aci318({ id: 'aci318m-19', year: '19', isMetric: true });
