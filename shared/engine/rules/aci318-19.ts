import { aci318 } from './aci318.ts';

export const ACI_318_19 = aci318({ id: 'aci318-19', year: '19', isMetric: false });
