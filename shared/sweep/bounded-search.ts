import { barCoverMm } from '../engine/checks-detailing.ts';
import type { MeasureId } from '../engine/measures.ts';
import { isSameLength, isWithinLength } from '../engine/limits.ts';
import type { BandPoint } from './band.ts';
import { BoxHeap } from './box-heap.ts';
import type { ChunkResult } from './chunk.ts';
import type { FaceEntry } from './face-table.ts';
import { FrontBuilder } from './front.ts';
import { placementAt, prepareSweep, type Placement, type PreparedSweep } from './prepared-sweep.ts';
import type { SweepProblem, View } from './problem.ts';
import type { FrontPoint } from './result.ts';
import { BoxBounds, depthRange, type SearchBox } from './search-box.ts';
import { setTree } from './set-tree.ts';
import { splitBox } from './split-box.ts';
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
  /** Oriented; see `BoundedSearch.near`. */
  readonly near: readonly BandPoint[];
}

/** How far a search is. Of the sections it has, those neither evaluated nor ruled out lie in open boxes. */
export interface SearchState {
  readonly evaluated: number;
  readonly provenUnnecessary: number;
  readonly boxesOpen: number;
  readonly boxesClosed: number;
}

/** One of several searches that share the placements of a space between them: part 0 … of − 1. */
export interface SearchShare {
  readonly part: number;
  readonly of: number;
}

/** Placements searched together, so that what one holds spares the others; their tables of bars take some 0.3 MB each. */
const PLACEMENTS_AT_ONCE = 256;
/** Sections in a box from which it is evaluated rather than split: bounds of its parts would cost as much. */
const LEAF_SECTIONS = 16;
/** Open boxes from which the search goes down before it goes on, some 150 MB of them: exact in any order. */
const MOST_OPEN_BOXES = 1_000_000;

/**
 * Branch and bound over a design space (Land and Doig, 1960; for fronts the order of Papadias and others, 2003; memory).
 * A box is a run of neighbours on every axis. One whose bounds fail a check, or that a section found already beats in both
 * measures, is dropped whole; the box with the best leading measure is split next, down to rows which the hot loop
 * evaluates.
 */
export class BoundedSearch {
  private readonly prepared: PreparedSweep;
  private readonly steps: SweepSteps;
  /** What sections found elsewhere measure, so that they beat boxes here: by another part, or by an earlier search. */
  private readonly elsewhere = new FrontBuilder();
  private boxes = 0;
  private evaluated = 0;
  /** Placements begun, of those of this share. */
  private begun = 0;
  private openUpTo = PLACEMENTS_AT_ONCE;
  /** Numbers of the placements of this share. */
  private readonly placements: readonly number[];
  private readonly perPlacement: number;
  private readonly heap = new BoxHeap();
  private sectionsOpen = 0;
  private readonly hasBand: boolean;
  private readonly mostOpenBoxes: number;

  /** @throws InvalidSectionError as `prepareSweep` does. */
  constructor(
    problem: SweepProblem,
    view: View,
    share: SearchShare = { part: 0, of: 1 },
    mostOpenBoxes = MOST_OPEN_BOXES,
  ) {
    this.mostOpenBoxes = mostOpenBoxes;
    this.prepared = prepareSweep(problem, view);
    this.steps = openSweep(this.prepared);
    this.hasBand = hasBand(view);
    const { widthsMm, coversMm, stirrups, fyMPa, size } = this.prepared.space;
    const placements = widthsMm.length * coversMm.length * stirrups.length * fyMPa.length;
    this.placements = placementsOf(share, placements);
    this.perPlacement = size / placements;
  }

  /** Looks at so many boxes at most; true when nothing is left. */
  advance(boxes: number): boolean {
    for (let i = 0; i < boxes; i++) {
      if (this.begun < Math.min(this.placements.length, this.openUpTo)) {
        this.openPlacement(this.placements[this.begun++]!);
        continue;
      }
      const box = this.heap.size > this.mostOpenBoxes ? this.heap.popLast() : this.heap.pop();
      if (box) this.look(box);
      else if (this.begun < this.placements.length) this.openUpTo += PLACEMENTS_AT_ONCE;
      else return true;
    }
    return false;
  }

  /** A section of the space, looked at elsewhere, that meets every check; oriented as `signOf` has it. */
  noteElsewhere(x: number, y: number): void {
    this.elsewhere.add(x, y, 0);
  }

  get state(): SearchState {
    const { boxes, evaluated, heap } = this;
    const unbegun = this.placements.length - this.begun;
    const sections = this.placements.length * this.perPlacement;
    return {
      evaluated,
      provenUnnecessary: sections - evaluated - this.sectionsOpen - unbegun * this.perPlacement,
      boxesOpen: heap.size + unbegun,
      boxesClosed: boxes - heap.size,
    };
  }

  /** What it has found so far, oriented: less is better in both. */
  get found(): ChunkResult['front'] {
    return this.steps.finish().front;
  }

  /** The near-best band, oriented and one longer than is shown, once nothing is left; empty where it is not looked for. */
  get near(): readonly BandPoint[] {
    return this.hasBand ? this.steps.finish().band : [];
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
    if (!box.of.bounds.bound(box) || this.isBeaten(box)) return;
    this.heap.push(box);
    this.sectionsOpen += sectionsOf(box);
  }

  /** Nothing of the box can be on the front, nor in the near-best band where that is looked for. */
  private isBeaten({ x, y }: SearchBox): boolean {
    return (
      (this.steps.isBeaten(x, y) || this.elsewhere.isBeaten(x, y)) &&
      !(this.hasBand && x <= this.steps.bandReach())
    );
  }

  private look(box: SearchBox): void {
    this.sectionsOpen -= sectionsOf(box);
    if (this.isBeaten(box)) return;
    const sets = box.tension.sets.length * box.compression.sets.length * (box.fcTo - box.fcFrom);
    if (sets === 1 || sets * (box.depthTo - box.depthFrom) <= LEAF_SECTIONS) this.evaluate(box);
    else for (const part of splitBox(box, this.prepared)) this.offer(part);
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

/**
 * The numbers whose digits to the base of the shares add up to the part: neighbours and multiples fall to different ones,
 * so that no share has all of one stirrup, or all the narrow widths, where most of the work is.
 */
function placementsOf({ part, of }: SearchShare, count: number): number[] {
  const all = Array.from({ length: count }, (_, number) => number);
  if (of === 1) return all;
  return all.filter((number) => {
    let sum = 0;
    for (let rest = number; rest > 0; rest = Math.floor(rest / of)) sum += rest % of;
    return sum % of === part;
  });
}

/** Measures of which so many sections share each value that the best few hundred would be any of them. */
const FLAT_MEASURES: readonly MeasureId[] = [
  'depthMm',
  'widthMm',
  'concreteM3PerM',
  'formworkM2PerM',
  'barCount',
];

/** Whether a search finds the near-best band of a view besides its front. */
export const hasBand = ({ x }: View): boolean => !FLAT_MEASURES.includes(x);

const sectionsOf = ({ tension, compression, fcFrom, fcTo, depthFrom, depthTo }: SearchBox): number =>
  tension.sets.length * compression.sets.length * (fcTo - fcFrom) * (depthTo - depthFrom);

/** What is found, in the measures' own signs. */
export function frontOf(found: ChunkResult['front'], view: View): FrontPoint[] {
  const x = signOf(view.x);
  const y = signOf(view.y);
  return found.map((point) => ({
    index: point.ties[0]!,
    x: x * point.x,
    y: y * point.y,
    tieCount: point.tieCount,
    ties: point.ties,
  }));
}

/** The whole search at once. */
export function boundedFront(problem: SweepProblem, view: View): BoundedFront {
  const search = new BoundedSearch(problem, view);
  while (!search.advance(1 << 16));
  const { evaluated, provenUnnecessary, boxesClosed } = search.state;
  const sectionCount = evaluated + provenUnnecessary;
  const front = frontOf(search.found, view);
  return { view, sectionCount, evaluated, provenUnnecessary, boxes: boxesClosed, front, near: search.near };
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
