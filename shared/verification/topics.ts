import bars from './cases/bars.json' with { type: 'json' };
import curvature from './cases/curvature.json' with { type: 'json' };
import eurocode from './cases/eurocode.json' with { type: 'json' };
import flexure from './cases/flexure.json' with { type: 'json' };
import handWorked from './cases/hand-worked.json' with { type: 'json' };
import optima from './cases/optima.json' with { type: 'json' };
import seismic from './cases/seismic.json' with { type: 'json' };
import serviceability from './cases/serviceability.json' with { type: 'json' };
import shear from './cases/shear.json' with { type: 'json' };
import type { PublishedCase } from './published-case.ts';

export interface Topic {
  readonly id: string;
  readonly title: string;
  readonly cases: readonly PublishedCase[];
}

// A file read as data has the type of what it happens to hold; the book's own test reads every case through.
const topic = (id: string, title: string, cases: readonly unknown[]): Topic => ({
  id,
  title,
  cases: cases as readonly PublishedCase[],
});

/** The chapters of the book, one file of cases each. */
export const TOPICS: readonly Topic[] = [
  topic('flexure', 'Flexure at ultimate', flexure),
  topic('curvature', 'Cracking, curvature and ductility', curvature),
  topic('bars', 'Bars and bar fit', bars),
  topic('shear', 'Shear and stirrups', shear),
  topic('serviceability', 'Crack control and least depth', serviceability),
  topic('seismic', 'Seismic detailing', seismic),
  topic('eurocode', 'EN 1992-1-1', eurocode),
  topic('hand-worked', 'A section worked by hand', handWorked),
  topic('optima', 'Optima', optima),
];

export const PUBLISHED_CASES: readonly PublishedCase[] = TOPICS.flatMap(({ cases }) => cases);

export function getCase(id: string): PublishedCase {
  const found = PUBLISHED_CASES.find((published) => published.id === id);
  if (!found) throw new Error(`no case ${id}`);
  return found;
}
