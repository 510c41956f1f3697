/** The visits of a plan as a walk: block by block, and within a block from each building to the nearest not yet visited. */
import type { SurveyStep } from '../../screening/survey.js';

export interface Stop {
  readonly id: string;
  readonly name: string | null;
  readonly lon: number | null;
  readonly lat: number | null;
  /** Visits of the plan to this building, in its order. */
  readonly visits: readonly SurveyStep[];
}

export interface BlockWalk {
  /** null: buildings of no block. */
  readonly block: string | null;
  readonly stops: readonly Stop[];
  readonly hours: number;
}

/** The walks, the block whose first visit is planned first in front. */
export function walksOf(steps: readonly SurveyStep[]): readonly BlockWalk[] {
  const blocks = new Map<string | null, Map<string, SurveyStep[]>>();
  for (const step of steps) {
    const stops = blocks.get(step.group) ?? new Map<string, SurveyStep[]>();
    blocks.set(step.group, stops);
    stops.set(step.id, [...(stops.get(step.id) ?? []), step]);
  }
  return [...blocks].map(([block, stops]) => {
    const all = [...stops.values()].flatMap((visits): Stop[] =>
      visits.slice(0, 1).map(({ id, name, lon, lat }) => ({ id, name, lon, lat, visits })),
    );
    const hours = all.reduce((sum, { visits }) => sum + visits.reduce((own, visit) => own + visit.hours, 0), 0);
    return { block, stops: nearestNext(all), hours };
  });
}

interface Placed {
  readonly stop: Stop;
  readonly lon: number;
  readonly lat: number;
}

/** From the first stop to the nearest, and so on; those without coordinates last. */
function nearestNext(stops: readonly Stop[]): readonly Stop[] {
  const left = stops.flatMap((stop): Placed[] => {
    const { lon, lat } = stop;
    return lon === null || lat === null ? [] : [{ stop, lon, lat }];
  });
  const walk: Stop[] = [];
  let here = left.shift();
  while (here !== undefined) {
    walk.push(here.stop);
    const from = here;
    const [nearest] = left.map((to, i) => ({ i, distance: apart(from, to) })).sort((a, b) => a.distance - b.distance);
    here = nearest === undefined ? undefined : left.splice(nearest.i, 1)[0];
  }
  return [...walk, ...stops.filter(({ lon, lat }) => lon === null || lat === null)];
}

/** Squared distance in degrees of latitude: enough to tell which of two is nearer within a town. */
function apart(a: Placed, b: Placed): number {
  const north = a.lat - b.lat;
  const east = (a.lon - b.lon) * Math.cos((a.lat * Math.PI) / 180);
  return north * north + east * east;
}
