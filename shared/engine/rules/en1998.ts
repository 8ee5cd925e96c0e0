import type { FullNationalValues } from './national-values.ts';
import { meanTensionMPa } from './en1992-concrete.ts';
import type { SeismicRules, SeismicSystems } from './seismic-rules.ts';

/**
 * Local ductility of primary beams in their critical regions by EN 1998-1:2004: class M 5.4.3.1, class H 5.5.3.1 (memory of
 * the standard). The section is taken to lie in a critical region.
 */
const BOOK = 'EN 1998-1';
/** ρmin over fctm/fyk (5.4.3.1.2(5)), and A′s over As at the least (5.4.3.1.2(4)). */
const LEAST_SHARE = 0.5;
const COMPRESSION_SHARE = 0.5;
/** Of ρmax = ρ′ + 0.0018 fcd/(μφ εsy,d fyd) (5.4.3.1.2(4)). */
const MOST_COEFFICIENT = 0.0018;
const LEAST_HOOP_MM = 6;

export function en1998(values: FullNationalValues): SeismicSystems {
  return { dcm: ductile('M', values), dch: ductile('H', values) };
}

function ductile(level: 'M' | 'H', values: FullNationalValues): SeismicRules {
  const isHigh = level === 'H';
  const section = isHigh ? '5.5.3.1' : '5.4.3.1';
  // the limits of class M are those of class H too
  const steel = isHigh ? '5.5.3.1.3, 5.4.3.1.2' : '5.4.3.1.2';
  const [fixedMm, bars] = isHigh ? [175, 6] : [225, 8];
  return {
    title: `frame of ductility class ${level}`,
    leastWidth: isHigh ? { shareOfDepth: Infinity, mostMm: 200 } : null,
    leastSpanToDepth: null,
    largestFyMPa: null,
    steelLimits: (face, { fcMPa, fyMPa, esMPa, ductilityTarget }) => {
      const leastShare = (LEAST_SHARE * meanTensionMPa(fcMPa)) / fyMPa;
      if (face === 'compression')
        return { leastShare: 0, leastOfOther: COMPRESSION_SHARE, mostShare: Infinity, mostOfOther: 0 };
      const fcd = (values.alphaCc * fcMPa) / values.gammaC;
      const fyd = fyMPa / values.gammaS;
      const mostShare =
        ductilityTarget === null || ductilityTarget === 0
          ? Infinity
          : (MOST_COEFFICIENT * fcd) / (ductilityTarget * (fyd / esMPa) * fyd);
      return { leastShare, leastOfOther: 0, mostShare, mostOfOther: mostShare === Infinity ? 0 : 1 };
    },
    continuousBars: isHigh ? { count: 2, leastDiameterMm: 14 } : null,
    reversalShare: null,
    hoops: {
      shareOfEffectiveDepth: Infinity,
      shareOfDepth: 1 / 4,
      byBarsMm: (leastBarMm, hoopMm) => Math.min(24 * hoopMm, fixedMm, bars * leastBarMm),
      countsSkinBars: false,
      leastHoopMm: () => LEAST_HOOP_MM,
    },
    clauses: {
      width: `${BOOK} 5.5.1.2.1(1)`,
      span: BOOK,
      steel: `${BOOK} ${section}.${isHigh ? '3' : '2'}`,
      leastSteel: (face) => `${BOOK} ${steel}${face === 'tension' ? '(5)' : '(4)'}`,
      mostSteel: `${BOOK} ${steel}(4)`,
      bars: `${BOOK} 5.5.3.1.3(5)`,
      reversal: BOOK,
      hoops: `${BOOK} ${section}.${isHigh ? '3(6)' : '2(6)'}`,
    },
    formulas: {
      width: '200 mm',
      leastSteel: (face) => (face === 'tension' ? '0.5 fctm b d/fyk' : 'As of the other face/2'),
      mostSteel: 'As of the other face + 0.0018 fcd b d/(μφ εyd fyd)',
      hoops: `min(h/4, 24 ds, ${fixedMm} mm, ${bars} db)`,
    },
  };
}
