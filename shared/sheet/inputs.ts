import type { UnitSystem } from '../contract/design-basis.ts';
import type { Candidate, Snapshot } from '../contract/records.ts';
import { getBar } from '../engine/bars.ts';
import type { FaceArrangement } from '../engine/evaluation.ts';
import type { Support } from '../engine/section.ts';
import { flangeText } from '../print/flange-text.ts';
import { codeSymbols } from '../print/code-symbols.ts';
import { faceWord } from '../print/face-word.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import { barsText, givenStirrupText, sizeText, steelText, stirrupText } from '../print/section-text.ts';
import type { DisplayKind } from '../print/units.ts';
import { basisItems, nationalItems, type Print } from './basis-items.ts';
import type { InputGroup, KeyText } from './sheet.ts';

const SUPPORT: Readonly<Record<Support, string>> = {
  simple: 'simply supported',
  'one-end-continuous': 'one end continuous',
  'both-ends-continuous': 'both ends continuous',
  cantilever: 'cantilever',
};

/** Everything that went into the numbers, with its unit. */
export function inputGroups(snapshot: Snapshot, beam: Candidate['beam'], units: UnitSystem): InputGroup[] {
  const print: Print = (value, kind) => formatQuantity(value, kind, units);
  return [
    { title: 'Section', items: sectionItems(snapshot, units, print) },
    { title: 'Demand', items: demandItems(snapshot, beam, print) },
    { title: 'Design basis', items: basisItems(snapshot, print) },
    { title: 'National values', items: nationalItems(snapshot, print) },
    { title: 'Bars as placed', isResult: true, items: placedItems(snapshot, units, print) },
  ].filter(({ items }) => items.length > 0);
}

function sectionItems({ section, basis, evaluation }: Snapshot, units: UnitSystem, print: Print): KeyText[] {
  const symbols = codeSymbols(evaluation.ruleSet.id);
  return [
    { label: evaluation.flange ? 'bw × h' : 'b × h', value: sizeText({ ...section, flange: null }, units) },
    ...(evaluation.flange ? [{ label: 'Flange, bf × hf', value: flangeText(evaluation.flange, units) }] : []),
    { label: 'Steel', value: steelText(section, units) },
    { label: 'Stirrups', value: givenStirrupText(section.stirrup, units) },
    { label: 'Clear cover to the stirrup', value: print(section.coverMm, 'length') },
    { label: symbols.fc, value: print(section.fcMPa, 'stress') },
    { label: symbols.fy, value: print(section.fyMPa, 'stress') },
    // Snapshots from before stirrups had a strength of their own lack it.
    { label: symbols.fyt, value: print((basis as Partial<typeof basis>).fytMPa, 'stress') },
  ].filter(({ value }) => value !== '');
}

function demandItems({ demand, evaluation }: Snapshot, beam: Candidate['beam'], print: Print): KeyText[] {
  const symbols = codeSymbols(evaluation.ruleSet.id);
  const asked = (value: number | null | undefined, kind: DisplayKind) => print(value, kind) || 'not asked';
  return [
    { label: symbols.moment, value: asked(demand.muNmm, 'moment') },
    { label: symbols.shear, value: asked(demand.vuN, 'force') },
    { label: 'μφ at least', value: asked(demand.ductilityTarget, 'count') },
    { label: 'h at most', value: asked(demand.depthCapMm, 'length') },
    ...(demand.support && demand.spanMm
      ? [{ label: 'Span checked', value: `${print(demand.spanMm, 'span')}, ${SUPPORT[demand.support]}` }]
      : []),
    { label: 'Beams', value: `${beam.count} of ${print(beam.spanMm, 'span')}` },
  ];
}

function placedItems(snapshot: Snapshot, units: UnitSystem, print: Print): KeyText[] {
  const { geometry, arrangement, ruleSet } = snapshot.evaluation;
  const { compressionSteel } = codeSymbols(ruleSet.id);
  const area = (value: number) => formatQuantity(value, 'area', units, { digits: 4 });
  const ratio = (value: number) => formatQuantity(value, 'ratio', 'si', { digits: 4 });
  return [
    ...builtItems(snapshot, units, print),
    ...(arrangement?.faces ?? []).flatMap((face) => faceItems(snapshot, face, print)),
    ...(geometry === null
      ? []
      : [
          { label: 'As, ρ = As/(b d)', value: `${area(geometry.asMm2)}, ${ratio(geometry.rho)}` },
          ...(geometry.asPrimeMm2 === 0
            ? []
            : [
                {
                  label: `${compressionSteel}, ρ′ = ${compressionSteel}/(b d)`,
                  value: `${area(geometry.asPrimeMm2)}, ${ratio(geometry.rhoPrime)}`,
                },
              ]),
          { label: 'dt, outermost layer', value: print(geometry.dtMm, 'length') },
          ...(geometry.dPrimeMm === null ? [] : [{ label: 'd′', value: print(geometry.dPrimeMm, 'length') }]),
        ]),
  ];
}

/** Stirrups whose spacing was found, and the bars along the sides. Results from before either was lack both. */
function builtItems({ evaluation }: Snapshot, units: UnitSystem, print: Print): KeyText[] {
  const { stirrups, skin } = evaluation as Partial<typeof evaluation>;
  return [
    ...(stirrups?.isDesigned
      ? [
          { label: 'Stirrups as designed', value: stirrupText(stirrups, units) },
          ...(stirrups.governs === null
            ? []
            : [
                {
                  label: 'Spacing by',
                  value: `${stirrups.reason.replace(/^governed by /, '')}${stirrups.neededMm !== null && stirrups.neededMm >= stirrups.spacingMm ? `, ${print(stirrups.neededMm, 'length')} before rounding down` : ''}`,
                },
              ]),
        ]
      : []),
    ...(skin && skin.perSide > 0
      ? [
          {
            label: 'Side bars, not in strength',
            value: `${skin.perSide}-${skin.bar} a side, ${print(skin.spacingMm, 'length')} apart, at most ${print(skin.allowedMm, 'length')}`,
          },
        ]
      : []),
  ];
}

const FACE_NAME = { bottom: 'Bottom', top: 'Top' } as const;

function faceItems(snapshot: Snapshot, face: FaceArrangement, print: Print): KeyText[] {
  const { section, basis, evaluation } = snapshot;
  if (face.layerCounts.length === 0) return [];
  const name = FACE_NAME[faceWord(face.face, section)];
  const nearest = evaluation.arrangement!.bars.filter((bar) => bar.face === face.face && bar.layer === 0);
  const offset = (yMm: number) => (face.face === 'tension' ? section.depthMm - yMm : yMm);
  const stirrupMm = section.stirrup === null ? 0 : getBar(basis.barStandard, section.stirrup.bar).diameterMm;
  const largest = nearest.reduce((a, b) => (b.diameterMm > a.diameterMm ? b : a));
  const centreMm = offset(largest.yMm);
  const isAgainstStirrup = Math.abs(section.coverMm + stirrupMm + largest.diameterMm / 2 - centreMm) < 1e-6;
  const group = section.reinforcement.kind === 'bars' ? section.reinforcement[face.face] : [];
  return [
    {
      label: `${name} bars`,
      value: `${barsText(group)}, layers of ${face.layerCounts.join(' + ')}`,
    },
    {
      label: `${name} bar centre`,
      value: `${isAgainstStirrup ? `${print(section.coverMm, 'length')} + ${print(stirrupMm, 'length')} + ${print(largest.diameterMm, 'length')}/2 = ` : ''}${print(centreMm, 'length')} from its face`,
    },
    ...(face.clearGapMm === null
      ? []
      : [
          {
            label: `${name} clear gap`,
            value: `${print(face.clearGapMm, 'length')}, least allowed ${print(face.requiredGapMm, 'length')}`,
          },
        ]),
  ];
}
