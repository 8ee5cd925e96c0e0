import { MM_PER_IN, MPA_PER_PSI } from '../units.ts';
import type { SeismicClauses, SeismicRules, SeismicSystems } from './seismic-rules.ts';

/**
 * Beams of moment frames by ACI 318 18.3.2 (ordinary), 18.4.2 (intermediate), 18.6 (special). All from memory of the
 * standards; the editions differ in what they say of Grade 80.
 */
interface Book {
  readonly title: string;
  readonly year: '14' | '19';
  readonly isMetric: boolean;
  /** As,min/(b d) without the waiver (9.6.1.2), which 18.6.3.1 asks of both faces. */
  readonly leastSteelShare: (fcMPa: number, fyMPa: number) => number;
  /** Least hoop round a bar, 25.7.2.2, mm. */
  readonly leastTieDiameterMm: (barDiameterMm: number) => number;
}

/** Relative slack of a yield strength typed in another unit. */
const withSlack = (fyMPa: number) => fyMPa * (1 + 1e-9);

export function aciSeismic(book: Book): SeismicSystems {
  return { ordinary: ordinary(book), intermediate: intermediate(book), special: special(book) };
}

function clausesOf({ title }: Book, section: string): SeismicClauses {
  return {
    width: `${title} 18.6.2.1`,
    span: `${title} 18.6.2.1`,
    steel: `${title} 18.6.3.1`,
    leastSteel: () => `${title} 18.6.3.1`,
    mostSteel: `${title} 18.6.3.1`,
    bars: `${title} ${section}`,
    reversal: `${title} 18.6.3.2`,
    hoops: `${title} 18.6.4.4`,
  };
}

const NO_FORMULAS = { width: '', leastSteel: () => '', mostSteel: '', hoops: '' };

function ordinary(book: Book): SeismicRules {
  return {
    title: 'ordinary moment frame',
    leastWidth: null,
    leastSpanToDepth: null,
    largestFyMPa: null,
    steelLimits: null,
    continuousBars: { count: 2, leastDiameterMm: 0 },
    reversalShare: null,
    hoops: null,
    clauses: clausesOf(book, '18.3.2'),
    formulas: NO_FORMULAS,
  };
}

function intermediate(book: Book): SeismicRules {
  const fixedMm = book.isMetric ? 300 : 12 * MM_PER_IN;
  return {
    ...ordinary(book),
    title: 'intermediate moment frame',
    reversalShare: 1 / 3,
    hoops: {
      shareOfEffectiveDepth: 1 / 4,
      shareOfDepth: Infinity,
      byBarsMm: (leastBarMm, hoopMm) => Math.min(8 * leastBarMm, 24 * hoopMm, fixedMm),
      countsSkinBars: true,
      leastHoopMm: book.leastTieDiameterMm,
    },
    clauses: {
      ...clausesOf(book, '18.4.2.1'),
      reversal: `${book.title} 18.4.2.2`,
      hoops: `${book.title} 18.4.2.4`,
    },
    formulas: {
      ...NO_FORMULAS,
      hoops: `min(d/4, 8 db, 24 ds, ${book.isMetric ? '300 mm' : '12 in'})`,
    },
  };
}

function special(book: Book): SeismicRules {
  const { isMetric } = book;
  const grade60 = withSlack(isMetric ? 420 : 60000 * MPA_PER_PSI);
  const grade80 = withSlack(isMetric ? 550 : 80000 * MPA_PER_PSI);
  const knowsGrade80 = book.year === '19';
  const fixedMm = isMetric ? 150 : 6 * MM_PER_IN;
  const grades = isMetric ? ['Grade 420', 'Grade 550'] : ['Grade 60', 'Grade 80'];
  return {
    title: 'special moment frame',
    leastWidth: { shareOfDepth: 0.3, mostMm: isMetric ? 250 : 10 * MM_PER_IN },
    leastSpanToDepth: 4,
    largestFyMPa: knowsGrade80 ? grade80 : grade60,
    steelLimits: (_, { fcMPa, fyMPa }) => ({
      leastShare: book.leastSteelShare(fcMPa, fyMPa),
      leastOfOther: 0,
      mostShare: fyMPa <= grade60 || !knowsGrade80 ? 0.025 : 0.02,
      mostOfOther: 0,
    }),
    continuousBars: { count: 2, leastDiameterMm: 0 },
    reversalShare: 1 / 2,
    hoops: {
      shareOfEffectiveDepth: 1 / 4,
      shareOfDepth: Infinity,
      byBarsMm: (leastBarMm, _, fyMPa) =>
        Math.min((fyMPa <= grade60 || !knowsGrade80 ? 6 : 5) * leastBarMm, fixedMm),
      countsSkinBars: false,
      leastHoopMm: book.leastTieDiameterMm,
    },
    clauses: clausesOf(book, '18.6.3.1'),
    formulas: {
      width: `min(0.3 h, ${isMetric ? '250 mm' : '10 in'})`,
      leastSteel: () => 'As,min of the face, not waived',
      mostSteel: knowsGrade80 ? `0.025 b d to ${grades[0]}, 0.020 b d to ${grades[1]}` : '0.025 b d',
      hoops: knowsGrade80
        ? `min(d/4, 6 db to ${grades[0]} or 5 db to ${grades[1]}, ${isMetric ? '150 mm' : '6 in'})`
        : `min(d/4, 6 db, ${isMetric ? '150 mm' : '6 in'})`,
    },
  };
}
