/** The buildings in plan: metres east and north of the portfolio's middle, the same scale both ways, north up. */
import { formatCount, formatNumber, shownValue, unitLabel } from '../../../engineering/format.js';
import type { PageData } from '../../../engineering/page-contract.js';
import { buildingLabel, counted, listLength } from '../reading.js';
import { groundPlan } from './ground-plan.js';
import { placeNumbers } from './map-numbers.js';
import { columnsOf, rendererFor } from './chart.js';
import type { Chart } from './chart.js';

const MOST_NUMBERED = 60;

interface Spot {
  readonly i: number;
  readonly east: number;
  readonly north: number;
}

/** Buildings with coordinates, in display lengths from the middle of their extent. */
function spotsOf({ buildings, display }: PageData): { readonly spots: readonly Spot[]; readonly unit: string } {
  const placed = Array.from({ length: buildings.shown }, (_, i) => ({ i, lon: buildings.lon[i] ?? NaN, lat: buildings.lat[i] ?? NaN })).filter(
    ({ lon, lat }) => !Number.isNaN(lon) && !Number.isNaN(lat),
  );
  const plan = groundPlan(placed);
  const wide = plan.some(({ east_m, north_m }) => Math.max(Math.abs(east_m), Math.abs(north_m)) > 3000);
  // A town in kilometres; feet stay feet.
  const kilometres = wide && display === 'si';
  const shown = (metres: number): number => (kilometres ? metres / 1000 : shownValue(metres, 'm', display));
  const spots = plan.map(({ east_m, north_m }, at) => ({ i: placed[at]?.i ?? -1, east: shown(east_m), north: shown(north_m) }));
  return { spots, unit: kilometres ? 'km' : unitLabel('m', display) };
}

/** The map, or null when no building has coordinates. */
export function mapChart(data: PageData): Chart | null {
  const { spots, unit } = spotsOf(data);
  if (spots.length === 0) return null;
  const listed = listLength(data);
  const half = (values: readonly number[]): number => values.reduce((most, value) => Math.max(most, Math.abs(value)), unit === 'km' ? 0.5 : 25) * 1.06;
  const reach = { east: half(spots.map(({ east }) => east)), north: half(spots.map(({ north }) => north)) };
  const rows = spots.map((spot) => ({
    ...spot,
    size: spot.i < listed ? 150 : spots.length > 1000 ? 9 : 34,
    place: spot.i < listed ? 'in the list' : 'not in the list',
    number: spot.i < listed && listed <= MOST_NUMBERED ? String(spot.i + 1) : '',
  }));
  const inList = rows.filter(({ i }) => i < listed);
  return {
    id: 'map',
    title: 'Where the buildings stand',
    sentence: sentence(data, rows.length, inList, reach, unit),
    table: {
      caption: `Listed buildings, ${unit} east and north of the middle of the portfolio`,
      head: ['Rank', 'Building', `East (${unit})`, `North (${unit})`],
      rows: inList.map(({ i, east, north }) => [formatCount(i + 1), buildingLabel(data, i), formatNumber(east, 3), formatNumber(north, 3)]),
    },
    // The list comes last, so that it is drawn on top.
    data: { spots: columnsOf([...rows].reverse()), numbers: columnsOf(placeNumbers(inList.length === 0 ? rows.slice(0, 1) : inList, Math.max(reach.east / 450, reach.north / 220))) },
    renderer: rendererFor(rows.length),
    spec: spec(unit, reach),
  };
}

function spec(unit: string, reach: { readonly east: number; readonly north: number }): Chart['spec'] {
  // One length per pixel for both axes: the tighter side decides.
  const perPixel = `max(${String(reach.east)} / (width / 2), ${String(reach.north)} / (height / 2))`;
  const axis = (field: 'east' | 'north', side: 'width' | 'height') =>
    ({
      field,
      type: 'quantitative' as const,
      title: field === 'east' ? `East of the middle (${unit})` : `North of the middle (${unit})`,
      scale: {
        zero: false,
        nice: false,
        domainMin: { expr: `-${side} / 2 * ${perPixel}` },
        domainMax: { expr: `${side} / 2 * ${perPixel}` },
      },
      axis: { tickCount: 6, format: '~f' },
    });
  const x = axis('east', 'width');
  const y = axis('north', 'height');
  const places = ['in the list', 'not in the list'];
  return {
    width: 'container',
    height: 480,
    layer: [
      {
        data: { name: 'spots' },
        mark: { type: 'point', filled: true, opacity: 0.9, strokeWidth: 1 },
        encoding: {
          x,
          y,
          shape: { field: 'place', type: 'nominal' as const, title: null, scale: { domain: places, range: ['diamond', 'circle'] } },
          size: { field: 'size', type: 'quantitative' as const, scale: null },
          color: { field: 'place', type: 'nominal' as const, title: null, scale: { domain: places, range: ['var(--accent)', 'var(--mark-soft)'] } },
        },
      },
      {
        data: { name: 'numbers' },
        mark: { type: 'text', align: 'center', fontSize: 11.5, fontWeight: 600 },
        encoding: { x, y, text: { field: 'number', type: 'nominal' as const } },
      },
      {
        data: { values: [{}] },
        mark: { type: 'text', text: ['↑', 'N'], x: 14, y: 12, fontSize: 13, fontWeight: 600, lineHeight: 14 },
      },
    ],
  };
}

function sentence(
  data: PageData,
  placed: number,
  inList: readonly Spot[],
  reach: { readonly east: number; readonly north: number },
  unit: string,
): string {
  const { shown, group } = data.buildings;
  const blocks = new Map<string, number>();
  for (const { i } of inList) {
    const block = group[i];
    if (block !== null && block !== undefined) blocks.set(block, (blocks.get(block) ?? 0) + 1);
  }
  const [first] = [...blocks.entries()].sort((a, b) => b[1] - a[1]);
  const missing = shown - placed;
  const extent = `${formatNumber(2 * reach.east, 2)} ${unit} from west to east and ${formatNumber(2 * reach.north, 2)} ${unit} from south to north`;
  return (
    `The plan covers about ${extent}, at one scale both ways, north up; numbers are ranks.` +
    (first === undefined || first[1] < 2 ? '' : ` With ${formatCount(first[1])}, ${first[0]} holds the most listed buildings.`) +
    (missing === 0 ? '' : ` Not drawn, for want of coordinates: ${counted(missing, 'building', 'buildings')}.`)
  );
}

/** Said in place of the map. */
export const NO_MAP = 'The inventory gives no coordinates, so there is no map.';

