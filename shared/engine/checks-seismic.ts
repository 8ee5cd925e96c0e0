import { getBar } from './bars.ts';
import { check, type CheckContext } from './check-result.ts';
import type { CheckResult } from './evaluation.ts';
import { isAtLeastTimes, isWithinLength } from './limits.ts';
import { reversedStrength } from './reversal.ts';
import type { FaceSteelLimits, SeismicRules } from './rules/seismic-rules.ts';
import { FACES, type BarGroup, type BarStandard, type Face } from './section.ts';
import { faceLeastMm2, faceMostMm2, leastWebMm } from './seismic.ts';
import type { SteelLayout } from './steel-layout.ts';
import { hoopLimitMm } from './stirrup-design.ts';

/** What the moment frame asks of its beams, in the order of CHECK_IDS; none where no system is asked. */
export function seismicChecks(context: CheckContext): readonly (CheckResult | null)[] {
  const { seismic } = context;
  if (!seismic) return [];
  return [
    width(context, seismic),
    span(context, seismic),
    steel(context, seismic),
    bars(context, seismic),
    reversal(context, seismic),
    hoops(context, seismic),
  ];
}

function width({ section }: CheckContext, seismic: SeismicRules): CheckResult | null {
  if (!seismic.leastWidth) return null;
  const leastMm = leastWebMm(seismic.leastWidth, section.depthMm);
  return check({
    id: 'seismic-width',
    passes: isWithinLength(leastMm, section.widthMm),
    demand: leastMm,
    capacity: section.widthMm,
    ratio: leastMm / section.widthMm,
    kind: 'length',
    clause: seismic.clauses.width,
    reason: `least width in a ${seismic.title}`,
  });
}

function span({ demand, placed }: CheckContext, seismic: SeismicRules): CheckResult | null {
  const least = seismic.leastSpanToDepth;
  if (least === null || !demand.spanMm || !placed.layout) return null;
  const leastMm = least * placed.layout.dMm;
  return check({
    id: 'seismic-span',
    passes: isAtLeastTimes(demand.spanMm, least, placed.layout.dMm),
    demand: leastMm,
    capacity: demand.spanMm,
    ratio: leastMm / demand.spanMm,
    kind: 'length',
    clause: seismic.clauses.span,
    reason: `clear span at least ${least} d; the span given is taken as clear`,
  });
}

/** Effective depth of a face's own steel, mm; that of the other face where it has none. */
const faceDepthMm = ({ dMm, dPrimeMm }: SteelLayout, face: Face, depthMm: number) =>
  face === 'tension' || dPrimeMm === null ? dMm : depthMm - dPrimeMm;

type SteelContext = Pick<CheckContext, 'section' | 'basis' | 'demand' | 'placed' | 'seismic'>;

/** Limits of one face's steel with what they are worked out from. */
export function faceSteelOf({ section, basis, demand, placed, seismic }: SteelContext, face: Face) {
  const limits = seismic?.steelLimits?.(face, {
    fcMPa: section.fcMPa,
    fyMPa: section.fyMPa,
    esMPa: basis.esMPa,
    ductilityTarget: demand.ductilityTarget,
  });
  const { layout } = placed;
  if (!limits || !layout) return null;
  const [areaMm2, otherMm2] =
    face === 'tension' ? [layout.asMm2, layout.asPrimeMm2] : [layout.asPrimeMm2, layout.asMm2];
  const dMm = faceDepthMm(layout, face, section.depthMm);
  const at: readonly [FaceSteelLimits, number, number, number] = [limits, section.widthMm, dMm, otherMm2];
  return { face, areaMm2, otherMm2, dMm, leastMm2: faceLeastMm2(...at), mostMm2: faceMostMm2(...at) };
}

function steel(context: CheckContext, seismic: SeismicRules): CheckResult | null {
  const faces = FACES.map((face) => faceSteelOf(context, face)).filter((face) => face !== null);
  if (faces.length === 0) return null;
  const base = { id: 'seismic-steel', clause: seismic.clauses.steel } as const;
  const { fyMPa } = context.section;
  const { largestFyMPa } = seismic;
  if (largestFyMPa !== null && !(fyMPa <= largestFyMPa))
    return check({
      ...base,
      passes: false,
      demand: fyMPa,
      capacity: largestFyMPa,
      ratio: fyMPa / largestFyMPa,
      kind: 'stress',
      reason: `highest yield strength of bars in a ${seismic.title}`,
    });
  const limits = faces.flatMap(({ face, areaMm2, leastMm2, mostMm2 }) => [
    {
      passes: areaMm2 >= leastMm2,
      ...{ demand: leastMm2, capacity: areaMm2, reason: `least steel of the ${face} face` },
    },
    {
      passes: areaMm2 <= mostMm2,
      ...{ demand: areaMm2, capacity: mostMm2, reason: `most steel of the ${face} face` },
    },
  ]);
  const worst = limits.reduce((a, b) => (ratioOf(b) > ratioOf(a) ? b : a));
  return check({
    ...base,
    ...worst,
    passes: limits.every(({ passes }) => passes),
    ratio: worst.demand / worst.capacity,
    kind: 'area',
  });
}

/** Demand over capacity; nothing asked of nothing there passes, something asked of nothing is worst. */
const ratioOf = ({ demand, capacity }: { readonly demand: number; readonly capacity: number }) =>
  demand === 0 ? 0 : demand / capacity;

/** Bars of a group that may run through: of the least diameter asked. */
export const throughBars = (group: BarGroup, standard: BarStandard, leastDiameterMm: number) =>
  group.reduce(
    (total, { bar, count }) =>
      isWithinLength(leastDiameterMm, getBar(standard, bar).diameterMm) ? total + count : total,
    0,
  );

function bars({ section, basis }: CheckContext, seismic: SeismicRules): CheckResult | null {
  const asked = seismic.continuousBars;
  const { reinforcement } = section;
  if (!asked || reinforcement.kind === 'layers') return null;
  const fewest = Math.min(
    ...FACES.map((face) => throughBars(reinforcement[face], basis.barStandard, asked.leastDiameterMm)),
  );
  return check({
    id: 'seismic-bars',
    passes: fewest >= asked.count,
    demand: asked.count,
    capacity: fewest,
    ratio: asked.count / fewest,
    kind: 'count',
    clause: seismic.clauses.bars,
    reason: `${asked.count} bars at each face that run through the beam`,
  });
}

function reversal(context: CheckContext, seismic: SeismicRules): CheckResult | null {
  const { section, basis, ruleSet, placed, flexure } = context;
  const share = seismic.reversalShare;
  if (share === null || !placed.layout || !flexure) return null;
  const { momentNmm: reversed } = reversedStrength(section, placed.layout, basis, ruleSet);
  const leastNmm = share * flexure.nominalMomentNmm;
  return check({
    id: 'seismic-reversal',
    passes: isAtLeastTimes(reversed, 1, leastNmm),
    demand: leastNmm,
    capacity: reversed,
    ratio: leastNmm / reversed,
    kind: 'moment',
    clause: seismic.clauses.reversal,
    reason: 'Mn bent the other way against its share of Mn as asked, at the face of the joint',
  });
}

function hoops(context: CheckContext, seismic: SeismicRules): CheckResult | null {
  const { section, basis, placed, skin, stirrups } = context;
  const { layout } = placed;
  if (!seismic.hoops || !layout) return null;
  const base = { id: 'hoop-spacing', kind: 'length', clause: seismic.clauses.hoops } as const;
  const { stirrup, reinforcement } = section;
  if (!stirrup || !stirrups.rules)
    return check({ ...base, passes: false, demand: null, capacity: null, ratio: null, reason: 'no hoops' });
  const diameters =
    reinforcement.kind === 'layers'
      ? []
      : FACES.flatMap((face) =>
          reinforcement[face].map(({ bar }) => getBar(basis.barStandard, bar).diameterMm),
        );
  const hoopMm = getBar(basis.barStandard, stirrup.bar, ['stirrup', 'bar']).diameterMm;
  const leastMm = seismic.hoops.leastHoopMm(Math.max(0, ...diameters));
  if (!isWithinLength(leastMm, hoopMm))
    return check({
      ...base,
      passes: false,
      demand: leastMm,
      capacity: hoopMm,
      ratio: leastMm / hoopMm,
      reason: 'diameter of the hoops round bars of this size',
    });
  const hasSkin = skin !== null && skin.perSide > 0;
  const limitMm = hoopLimitMm(stirrups.rules, layout.dMm, section.depthMm, hasSkin);
  return check({
    ...base,
    passes: isWithinLength(stirrup.spacingMm, limitMm),
    demand: stirrup.spacingMm,
    capacity: limitMm,
    ratio: stirrup.spacingMm / limitMm,
    reason: `hoop spacing where hinges may form: ${seismic.formulas.hoops}`,
  });
}
