import { barCoverMm } from '../engine/checks-detailing.ts';
import { isSameLength, isWithinLength } from '../engine/limits.ts';
import { BoxHeap } from './box-heap.ts';
import type { FaceEntry } from './face-table.ts';
import { placementAt, prepareSweep, type Placement, type PreparedSweep } from './prepared-sweep.ts';
import type { SweepProblem, View } from './problem.ts';
import type { FrontPoint } from './result.ts';
import { BoxBounds, depthRange, type SearchBox } from './search-box.ts';
import { setTree } from './set-tree.ts';
import { openSweep, type SweepSteps } from './sweep-range.ts';
import { signOf } from './tally.ts';

/** The exact front of a space, with how little of it had to be evaluated. Plain JSON. */
export interface BoundedFront {
  readonly view: View;
  readonly sectionCount: number;
  readonly evaluated: number;
  /** Sections that no evaluation could have put on the front: in boxes that fail a check whole or are beaten whole. */
  readonly provenUnnecessary: number;
  readonly boxes: number;
  /** As a sweep of every section gives it, ties too. */
  readonly front: readonly FrontPoint[];
}

/** Placements searched together, so that what one holds spares the others; their tables of bars take some 0.3 MB each. */
const PLACEMENTS_AT_ONCE = 256;
/** Sections in a box from which it is evaluated rather than split: a bound costs about what four sections do. */
const LEAF_SECTIONS = 8;

/**
 * Branch and bound over a design space (Land and Doig, 1960; for fronts the order of Papadias and others, 2003; memory).
 * A box is a run of neighbours on every axis. One whose bounds fail a check, or that a section found already beats in both
 * measures, is dropped whole; the box with the best leading measure is split next, down to rows which the hot loop
 * evaluates.
 */
class BoundedSearch {
  private readonly prepared: PreparedSweep;
  private readonly steps: SweepSteps;
  private readonly view: View;
  private boxes = 0;
  private evaluated = 0;
  private nextPlacement = 0;
  private openUpTo = PLACEMENTS_AT_ONCE;
  private readonly placementCount: number;
  private readonly heap = new BoxHeap();

  /** @throws InvalidSectionError as `prepareSweep` does. */
  constructor(problem: SweepProblem, view: View) {
    this.prepared = prepareSweep(problem, view);
    this.steps = openSweep(this.prepared);
    this.view = view;
    const { widthsMm, coversMm, stirrups, fyMPa } = this.prepared.space;
    this.placementCount = widthsMm.length * coversMm.length * stirrups.length * fyMPa.length;
  }

  /** Looks at so many boxes at most; true when nothing is left. */
  advance(boxes: number): boolean {
    for (let i = 0; i < boxes; i++) {
      if (this.nextPlacement < Math.min(this.placementCount, this.openUpTo)) {
        this.openPlacement(this.nextPlacement++);
        continue;
      }
      const box = this.heap.pop();
      if (box) this.look(box);
      else if (this.nextPlacement < this.placementCount) this.openUpTo += PLACEMENTS_AT_ONCE;
      else return true;
    }
    return false;
  }

  get progress() {
    const { boxes, evaluated, nextPlacement, placementCount } = this;
    return { boxes, evaluated, placements: nextPlacement, placementCount };
  }

  finish(): BoundedFront {
    const { view, boxes, evaluated } = this;
    const sectionCount = this.prepared.space.size;
    const x = signOf(view.x);
    const y = signOf(view.y);
    const front = this.steps.finish().front.map((point) => ({
      index: point.ties[0]!,
      x: x * point.x,
      y: y * point.y,
      tieCount: point.tieCount,
      ties: point.ties,
    }));
    return { view, sectionCount, evaluated, provenUnnecessary: sectionCount - evaluated, boxes, front };
  }

  private openPlacement(number: number): void {
    const { prepared } = this;
    const { space, problem } = prepared;
    const fyCount = space.fyMPa.length;
    const combination = Math.floor(number / fyCount);
    const fyAt = number % fyCount;
    const placement = placementAt(prepared, combination);
    const { columnWidthMm } = problem.rules;
    if (columnWidthMm !== null && !isSameLength(placement.widthMm, columnWidthMm)) return;
    const fyMPa = space.fyMPa[fyAt]!;
    const tension = setTree(placement.tension, (entry) =>
      isTensionAllowed(prepared, placement, fyMPa, entry),
    );
    const compression = setTree(placement.compression, (entry) => isFaceAllowed(prepared, placement, entry));
    const [depthFrom, depthTo] = depthRange(prepared, placement, fyMPa);
    if (!tension || !compression || depthFrom === depthTo) return;
    const of = { placement, combination, fyAt, bounds: new BoxBounds(prepared, placement, fyMPa) };
    const fcTo = space.fcMPa.length;
    this.offer({ of, tension, compression, fcFrom: 0, fcTo, depthFrom, depthTo, x: 0, y: 0 });
  }

  /** Keeps a box that may hold something. */
  private offer(box: SearchBox): void {
    this.boxes++;
    if (box.of.bounds.bound(box) && !this.steps.isBeaten(box.x, box.y)) this.heap.push(box);
  }

  private look(box: SearchBox): void {
    if (this.steps.isBeaten(box.x, box.y)) return;
    const sets = box.tension.sets.length * box.compression.sets.length * (box.fcTo - box.fcFrom);
    if (sets === 1 || sets * (box.depthTo - box.depthFrom) <= LEAF_SECTIONS) this.evaluate(box);
    else for (const part of split(box, this.prepared)) this.offer(part);
  }

  private evaluate(box: SearchBox): void {
    const { space, placements } = this.prepared;
    const { combination, fyAt, placement } = box.of;
    placements.set(combination, placement);
    const depths = space.depthsMm.length;
    for (const tension of box.tension.sets)
      for (const compression of box.compression.sets)
        for (let fcAt = box.fcFrom; fcAt < box.fcTo; fcAt++) {
          const set = (combination * space.tension.length + tension) * space.compression.length + compression;
          const row = ((set * space.fyMPa.length + fyAt) * space.fcMPa.length + fcAt) * depths;
          this.steps.advance(row + box.depthFrom, row + box.depthTo);
          this.evaluated += box.depthTo - box.depthFrom;
        }
  }
}

/** The whole search at once. */
export function boundedFront(problem: SweepProblem, view: View): BoundedFront {
  const search = new BoundedSearch(problem, view);
  while (!search.advance(1 << 16));
  return search.finish();
}

/** Sets that fail a check by themselves, in the hot loop's own comparisons, are not worth a box. */
function isFaceAllowed({ problem }: PreparedSweep, placement: Placement, entry: FaceEntry): boolean {
  if (entry.breaksBarRules) return false;
  const isHung =
    !problem.rules.requireHangers ||
    !placement.given ||
    Number.isNaN(entry.barCount) ||
    entry.barCount >= placement.given.legs;
  return isHung && isWithinLength(placement.leastForStirrupMm, placement.widthMm);
}

function isTensionAllowed(
  prepared: PreparedSweep,
  placement: Placement,
  fyMPa: number,
  entry: FaceEntry,
): boolean {
  if (!isFaceAllowed(prepared, placement, entry)) return false;
  if (Number.isNaN(entry.largestSpacingMm)) return true;
  const coverMm = barCoverMm(placement.coverMm, placement.stirrupBar);
  return isWithinLength(entry.largestSpacingMm, prepared.ruleSet.crackSpacingMm(fyMPa, coverMm));
}

/** Two parts of a box, cut across the axis whose ends lie furthest apart for their size. */
function split(box: SearchBox, { space, concretes }: PreparedSweep): SearchBox[] {
  const { tension, compression, fcFrom, fcTo, depthFrom, depthTo } = box;
  const leastH = space.depthsMm[depthFrom]!;
  const mostH = space.depthsMm[depthTo - 1]!;
  const ofAll = tension.mostAreaMm2 + compression.mostAreaMm2;
  const spreads = [
    tension.left ? (tension.mostAreaMm2 - tension.leastAreaMm2) / ofAll + TINY : 0,
    compression.left ? (compression.mostAreaMm2 - compression.leastAreaMm2) / ofAll + TINY : 0,
    fcTo - fcFrom > 1 ? FC_WEIGHT * (1 - concretes[fcFrom]!.fcMPa / concretes[fcTo - 1]!.fcMPa) + TINY : 0,
    depthTo - depthFrom > 1 ? 1 - leastH / mostH + TINY : 0,
  ];
  switch (spreads.indexOf(Math.max(...spreads))) {
    case 0:
      return [tension.left!, tension.right!].map((part) => ({ ...box, tension: part }));
    case 1:
      return [compression.left!, compression.right!].map((part) => ({ ...box, compression: part }));
    case 2: {
      const half = (fcFrom + fcTo) >>> 1;
      return [
        { ...box, fcTo: half },
        { ...box, fcFrom: half },
      ];
    }
    default: {
      const half = (depthFrom + depthTo) >>> 1;
      return [
        { ...box, depthTo: half },
        { ...box, depthFrom: half },
      ];
    }
  }
}

/** Strength moves bounds less than steel and depth do. */
const FC_WEIGHT = 0.3;
/** An axis that can be cut is preferred to one that cannot, equal ends or not. */
const TINY = 1e-12;
