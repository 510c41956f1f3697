/**
 * Errors that many buildings have in common: the table of coefficients of their code edition, and the site class of the zone whose
 * spectrum they read. Such an error moves all its buildings together. What is common to the whole portfolio changes no rank; what is
 * common to some of it moves them against the rest, and the edge of the list with them.
 *
 * Conditional Monte Carlo: the common errors are drawn, and with each draw the edge of the list is found in closed form. A building
 * is then as far from the edge as its own error and the drawn ones put it. Seen from the edge, the common errors of a building are
 * again one nearly normal error, whose variance is that of edge less error over the draws.
 */
import { normalQuantile } from '../numeric/normal.js';
import { hashText, philox } from '../numeric/philox.js';
import { ClassTable } from './class-table.js';
import type { PartClass } from './class-table.js';
import { NO_LABEL, labelOf } from './mixture.js';
import type { Mixture } from './mixture.js';
import type { SharedErrors, Zone } from './shared-errors.js';

/** Draws of the common errors, and what comes of them. */
export interface SharedDraws {
  /** ln S at which the list ends, one entry a draw. */
  readonly edge: Float64Array;
  /** Standard normal errors by label and by zone, one entry a draw. */
  readonly ofLabel: readonly Float64Array[];
  readonly ofZone: readonly Float64Array[];
  readonly rungs: SharedRungs;
  /** By zone, then label: what the variance of a part grows by (or shrinks) when ln S is seen from the edge of the list. */
  readonly change: readonly Float64Array[];
}

/** The edges of lists of other lengths. */
export interface SharedRungs {
  /** ln S at which each ends, on average of the draws. */
  readonly x: Float64Array;
  /** By zone, label and rung: what the variance of a part, seen from the edge of the list, grows by when it is seen from this one. */
  readonly change: Float64Array;
  /** The third central moment of this edge less the common errors of a part, likewise. */
  readonly third: Float64Array;
}

/** Common errors and the draws of them. */
export interface Common {
  readonly shared: SharedErrors;
  readonly draws: SharedDraws;
}

/** Cheap, since a draw reads tables alone; with 2 × 512 the chances of 600 buildings were still off by as much as by simulating 10,000 times. */
const PAIRS = 2048;
const KEY = 0x5a4e;
const LABELS = NO_LABEL + 1;

/** True where buildings have an error in common. */
export function hasShared(shared: SharedErrors | undefined): shared is SharedErrors {
  return shared?.zones.some(({ eraLoad, siteLoad }) => eraLoad > 0 || siteLoad > 0) ?? false;
}

/**
 * Draws the common errors of buildings with these `mixtures`, of which `places` are listed; `seed` keys the draws. The edges of lists
 * of as many buildings as `rungs` says, rising, are found beside.
 */
export function drawShared(
  mixtures: readonly Mixture[],
  shared: SharedErrors,
  places: number,
  seed: number,
  rungs: Float64Array,
): SharedDraws {
  const table = new ClassTable(mixtures, shared);
  const used = new Set(table.classes.map(({ label }) => label));
  // an edition that no part stands for is not drawn
  const ofLabel = shared.labels.map((name, label) =>
    used.has(label) ? standardDraws(`edition ${name}`, seed) : new Float64Array(0),
  );
  const ofZone = shared.zones.map(({ name }) => standardDraws(`zone ${name}`, seed));
  const edge = new Float64Array(2 * PAIRS);
  const along = Array.from(rungs, () => new Float64Array(2 * PAIRS));
  const shift = new Float64Array(table.classes.length);
  const at = new Float64Array(rungs.length);
  for (let d = 0; d < edge.length; d += 1) {
    table.classes.forEach(({ zone, label }, c) => {
      const { eraLoad, siteLoad } = shared.zones[zone]!;
      shift[c] = siteLoad * ofZone[zone]![d]! + (label === NO_LABEL ? 0 : eraLoad * ofLabel[label]![d]!);
    });
    if (places < mixtures.length) edge[d] = table.edge(places, shift);
    table.edges(rungs, shift, at);
    along.forEach((edges, rung) => (edges[d] = at[rung]!));
  }
  const errors = { shared, ofLabel, ofZone };
  const change = changeOf(errors, edge);
  return { edge, ofLabel, ofZone, change, rungs: sharedRungs(errors, table.classes, along, change) };
}

/** Ordered from the longest list to the shortest; of zones and labels that no part has nothing is told. */
function sharedRungs(
  drawn: Drawn,
  classes: readonly PartClass[],
  along: readonly Float64Array[],
  atEdge: readonly Float64Array[],
): SharedRungs {
  const falling = along.toReversed();
  const x = Float64Array.from(falling, mean);
  const change = sharedArray(drawn.shared.zones.length * LABELS * x.length);
  const third = sharedArray(change.length);
  for (const { zone, label } of classes) {
    const era = label === NO_LABEL ? 0 : drawn.shared.zones[zone]!.eraLoad;
    const first = (zone * LABELS + label) * x.length;
    falling.forEach((edges, rung) => {
      const { squares, cubes } = apartFrom(drawn, edges, x[rung]!, zone, label);
      change[first + rung] = squares - era * era - atEdge[zone]![label]!;
      third[first + rung] = cubes;
    });
  }
  return { x, change, third };
}

/** Threads read it where it is. */
function sharedArray(length: number): Float64Array {
  return new Float64Array(new SharedArrayBuffer(8 * length));
}

/** Standard normal draws and their negatives, with a variance of exactly 1. */
function standardDraws(name: string, seed: number): Float64Array {
  const z = new Float64Array(2 * PAIRS);
  const key = hashText(name);
  const words = new Uint32Array(4);
  let squares = 0;
  for (let d = 0; d < PAIRS; d += 1) {
    philox(d, 0, key, 0, seed, KEY, words);
    z[2 * d] = normalQuantile((words[0]! + 0.5) / 4294967296);
    squares += z[2 * d]! * z[2 * d]!;
  }
  const scale = Math.sqrt(PAIRS / squares);
  for (let d = 0; d < PAIRS; d += 1) {
    z[2 * d]! *= scale;
    z[2 * d + 1] = -z[2 * d]!;
  }
  return z;
}

/** Draws of the common errors. */
type Drawn = Pick<SharedDraws, 'ofLabel' | 'ofZone'> & { readonly shared: SharedErrors };

/** Variance of an edge less common errors, less what of it the part counts already: by zone, then label. */
function changeOf(drawn: Drawn, edge: Float64Array): readonly Float64Array[] {
  const middle = mean(edge);
  return drawn.shared.zones.map(({ eraLoad }, zone) => {
    const variance = (label: number): number => apartFrom(drawn, edge, middle, zone, label).squares;
    const change = new Float64Array(LABELS);
    drawn.ofLabel.forEach((z, label) => {
      if (z.length > 0) change[label] = variance(label) - eraLoad * eraLoad;
    });
    change[NO_LABEL] = variance(NO_LABEL);
    return change;
  });
}

/** Second and third central moment of an edge, whose mean is `middle`, less the errors common to a label in a zone. */
function apartFrom(
  { shared, ofLabel, ofZone }: Drawn,
  edge: Float64Array,
  middle: number,
  zone: number,
  label: number,
): { readonly squares: number; readonly cubes: number } {
  const { eraLoad, siteLoad } = shared.zones[zone]!;
  const ofSite = ofZone[zone]!;
  const ofEra = label === NO_LABEL ? null : ofLabel[label]!;
  let [squares, cubes] = [0, 0];
  for (let d = 0; d < edge.length; d += 1) {
    const apart = edge[d]! - middle - (ofEra === null ? 0 : eraLoad * ofEra[d]!) - siteLoad * ofSite[d]!;
    squares += apart * apart;
    cubes += apart * apart * apart;
  }
  return { squares: squares / edge.length, cubes: cubes / edge.length };
}

function mean(values: Float64Array): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

/** The changes of the parts of building i, by label. */
export function changesOf({ shared, draws }: Common, i: number): Float64Array {
  return draws.change[shared.zone[i]!]!;
}

/** The spread of a part of which the variance changes. */
export function changedSpread(sd: number, change: number): number {
  return Math.sqrt(Math.max(0, sd * sd + change));
}

/** `mixture` with other spreads, by the label of the part, in arrays of its own. */
export function changedMixture(mixture: Mixture, change: Float64Array): Mixture {
  const { weight, mean, sd, from, to } = mixture;
  const label = Uint8Array.from({ length: to - from }, (_, i) => labelOf(mixture, from + i));
  return {
    weight: weight.slice(from, to),
    mean: mean.slice(from, to),
    sd: sd.slice(from, to).map((one, i) => changedSpread(one, change[label[i]!]!)),
    label,
    from: 0,
    to: to - from,
  };
}

/** What takes the spreads of the parts of building i, seen from the edge, back to those without common errors: by label. */
export function toOwn({ shared, draws }: Common, i: number, label: number): number {
  const zone = shared.zone[i]!;
  const { eraLoad } = shared.zones[zone]!;
  return -draws.change[zone]![label]! - (label === NO_LABEL ? 0 : eraLoad * eraLoad);
}

/** What is added to the variance of the difference of a part of building i and one of building j, where they have errors in common. */
export function pairChange(common: Common, i: number, j: number): (labelI: number, labelJ: number) => number {
  const { zones, zone } = common.shared;
  const [a, b] = [zones[zone[i]!]!, zones[zone[j]!]!];
  const site = zone[i] === zone[j] ? 0 : a.siteLoad * a.siteLoad + b.siteLoad * b.siteLoad;
  return (k, l) => {
    const load = (label: number, { eraLoad }: Zone): number => (label === NO_LABEL ? 0 : eraLoad);
    const [p, q] = [load(k, a), load(l, b)];
    const era = k === l ? (p - q) * (p - q) : p * p + q * q;
    return era + site + toOwn(common, i, k) + toOwn(common, j, l);
  };
}
