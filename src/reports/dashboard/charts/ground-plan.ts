/** Places on the ground: metres from their middle, enough for a plan of a town. */

/** Mean radius of the earth (m), IUGG. */
const EARTH_M = 6371008.8;
const DEGREE_M = (EARTH_M * Math.PI) / 180;

export interface OnGround {
  readonly east_m: number;
  readonly north_m: number;
}

/** East and north (m) of each place from the middle of the extent of all, one scale both ways; degrees in. */
export function groundPlan(places: readonly { readonly lon: number; readonly lat: number }[]): readonly OnGround[] {
  const lon0 = middle(places.map(({ lon }) => lon));
  const lat0 = middle(places.map(({ lat }) => lat));
  const narrowing = Math.cos((lat0 * Math.PI) / 180);
  return places.map(({ lon, lat }) => ({ east_m: (lon - lon0) * DEGREE_M * narrowing, north_m: (lat - lat0) * DEGREE_M }));
}

function middle(values: readonly number[]): number {
  return (values.reduce((a, b) => Math.min(a, b), Infinity) + values.reduce((a, b) => Math.max(a, b), -Infinity)) / 2;
}
