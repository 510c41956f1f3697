/**
 * Rank bands: the places between which a building stands with a chance of 90 %. The chance to stand among the first r is the chance to
 * be above the edge of a list of r places, so a band is where that chance passes 5 and 95 %.
 */
import { exp } from '../numeric/elementary.js';
import { INVERSE_ROOT_TWO_PI, cdfFrom } from '../numeric/normal.js';
import { aboveThreshold, countAbove, countFrom } from './exceedance.js';
import type { AboveThreshold, Exceedance } from './exceedance.js';
import { NO_LABEL, mixtureCdf, mixtureMoments, mixtureQuantile } from './mixture.js';
import type { Mixture } from './mixture.js';
import type { Rungs } from './rungs.js';

/** What the chances and bands of single buildings are read from. */
export interface Edge {
  readonly curve: Exceedance;
  /** ln S at which the list ends; -Infinity when it holds every building. */
  readonly threshold: number;
  /** Null where some building has no spread, and where so few are ranked that bands are simulated. */
  readonly rungs: Rungs | null;
}

/** Chance and ends of the band of some of the buildings, in closed form; the chances still without those tied at the threshold. */
export interface Bands extends AboveThreshold {
  readonly rankBest: Int32Array;
  readonly rankWorst: Int32Array;
}

const Z95 = 1.6448536269514722;
const LABELS = NO_LABEL + 1;

/** The bands of `mixtures`, all of the buildings or some; `zone` has the number of the zone of each, where errors are common. */
export function bandsOf(
  mixtures: readonly Mixture[],
  { curve, threshold, rungs }: Edge,
  zone: ArrayLike<number> | undefined,
): Bands {
  const rankBest = new Int32Array(mixtures.length);
  const rankWorst = new Int32Array(mixtures.length);
  const endOf = rungs === null ? stepped(curve) : smooth(curve, rungs);
  const within = (place: number): number => Math.min(curve.n, Math.max(1, place));
  mixtures.forEach((m, i) => {
    rankBest[i] = within(endOf(m, zone?.[i] ?? 0, 0.95, Z95));
    rankWorst[i] = within(endOf(m, zone?.[i] ?? 0, 0.05, -Z95));
  });
  return { ...aboveThreshold(mixtures, threshold), rankBest, rankWorst };
}

/** The place at which a building stands with ln S at its quantile q, as seen from there; z is the standard normal quantile. */
type BandEnd = (mixture: Mixture, zone: number, q: number, z: number) => number;

/** Where parts have no spread the best rank counts only those above, the worst those at the same place too. */
const AT = 1e-9;

/** One more than the others expected above: where buildings have no spread. */
function stepped(curve: Exceedance): BandEnd {
  return (m, _zone, q, z) => {
    const x = mixtureQuantile(m, q, z, 1e-2);
    const count = z > 0 ? countAbove(curve, x) : countFrom(curve, x);
    return Math.round(1 + count - (1 - mixtureCdf(m, z > 0 ? x + AT : x - AT)));
  };
}

/** Where an x stands between two rungs. */
class Stand {
  j = 0;
  f = 0;
  /** Share of the gap per unit of x; 0 beyond the ends, where nothing changes any more. */
  perX = 0;
  readonly x: Float64Array;

  constructor(x: Float64Array) {
    this.x = x;
  }

  move(x: number): void {
    const { x: rungs } = this;
    const last = rungs.length - 2;
    while (this.j > 0 && rungs[this.j]! > x) this.j -= 1;
    while (this.j < last && rungs[this.j + 1]! <= x) this.j += 1;
    const gap = rungs[this.j + 1]! - rungs[this.j]!;
    const f = gap > 0 ? (x - rungs[this.j]!) / gap : 0;
    this.perX = f > 0 && f < 1 ? 1 / gap : 0;
    this.f = Math.min(1, Math.max(0, f));
  }

  /** Of values by rung, from `first` on. */
  read(values: Float64Array, first = 0): number {
    const here = values[first + this.j]!;
    return here + this.f * (values[first + this.j + 1]! - here);
  }

  rise(values: Float64Array, first = 0): number {
    return this.perX * (values[first + this.j + 1]! - values[first + this.j]!);
  }
}

/** A step of the search under this is the last: what is left is of the square of it. */
const LAST_STEP = 1e-2;
const LEAST_VARIANCE = 1e-12;

/** Newton steps inside a bracket, each with the spreads seen from where it stands. */
function smooth(curve: Exceedance, rungs: Rungs): BandEnd {
  const { apart, unsure, lean, change, third } = rungs;
  const stand = new Stand(rungs.x);
  return (m, zone, q, z) => {
    const { weight, mean, sd, label, from, to } = m;
    const moments = mixtureMoments(m);
    const reach = 1 + moments.sd;
    let x = moments.mean + z * moments.sd;
    let [low, high] = [-Infinity, Infinity];
    for (let pass = 0; pass < 60; pass += 1) {
      stand.move(x);
      const seen = x + stand.read(apart);
      const ofAll = stand.read(unsure);
      const ofAllRise = stand.rise(unsure);
      const ofAllCubes = stand.read(lean);
      let error = -q;
      let density = 0;
      for (let k = from; k < to; k += 1) {
        let variance = sd[k]! * sd[k]! + ofAll;
        let rise = ofAllRise;
        let cubes = ofAllCubes;
        if (change !== null && third !== null) {
          const first = (zone * LABELS + (label === undefined ? NO_LABEL : label[k]!)) * rungs.x.length;
          variance += stand.read(change, first);
          rise += stand.rise(change, first);
          cubes += stand.read(third, first);
        }
        const s = Math.sqrt(Math.max(LEAST_VARIANCE, variance));
        const u = (seen - mean[k]!) / s;
        const e = exp(-0.5 * u * u);
        // the first term of Edgeworth's series: edges of short lists are skew
        const skew = Math.max(-1, Math.min(1, cubes / (s * s * s))) / 6;
        error += weight[k]! * (cdfFrom(u, e) + INVERSE_ROOT_TWO_PI * e * skew * (u * u - 1));
        // the spread itself changes with x
        density += ((weight[k]! * e) / s) * (1 - (u * rise) / (2 * s)) * (1 + skew * u * (3 - u * u));
      }
      if (error > 0) high = x;
      else low = x;
      let next = x - error / (INVERSE_ROOT_TWO_PI * density);
      const inside = next > low && next < high;
      if (!inside) {
        if (low === -Infinity) next = x - reach;
        else next = high === Infinity ? x + reach : 0.5 * (low + high);
      }
      const step = Math.abs(next - x);
      x = next;
      if ((inside && step < LAST_STEP) || high - low < 1e-9) break;
    }
    stand.move(x);
    const others = countAbove(curve, x + stand.read(rungs.toCurve)) - (1 - q);
    return Math.ceil(others + stand.read(rungs.toPlaces));
  };
}
