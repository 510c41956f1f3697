/** The checks over single buildings, as one pass over the columns. */
import type { Database } from '../store/database.js';
import { quoteName } from '../store/sql.js';
import { CHECKS, HEIGHT_PER_STOREY, SMALLEST_PLATE_M2, STOREYS_OF_UNITS } from './checks.js';
import type { Check } from './checks.js';
import type { BuildingNotes } from './findings.js';
import type { Doubts } from './infer.js';
import type { Mapping } from './header.js';
import { medianOf } from './median.js';
import type { Plans } from './plans.js';
import type { Sizes } from './sizes.js';

export interface Contradictions extends Doubts {
  /** 1 where the year of retrofit cannot be. */
  readonly retrofitDoubted: Uint8Array;
  readonly column?: { readonly check: Check; readonly ratio: number };
}

/** Notes every contradiction, and blanks in `plans` the coordinates that cannot be. */
export function findContradictions(sizes: Sizes, plans: Plans, notes: BuildingNotes): Contradictions {
  const rows = sizes.rowCount;
  const storeysDoubted = new Uint8Array(rows);
  const storeysOfUnits = new Uint8Array(rows);
  const heightContradicted = new Uint8Array(rows);
  const retrofitDoubted = new Uint8Array(rows);
  const { storeys_above: storeys, height_m: height, floor_area_m2: area } = sizes;
  // A column that is not there is one of NaN, shared: the loop below is hot and reads arrays alone.
  const none = new Float64Array(rows).fill(NaN);
  const storeysAt = storeys ?? none;
  const heightAt = height ?? none;
  const areaAt = area ?? none;
  const totalAt = sizes.storeys_total ?? none;
  const belowAt = sizes.storeys_below ?? none;
  const builtAt = sizes.year_built ?? none;
  const retrofittedAt = sizes.year_retrofitted ?? none;
  const countAt = sizes.count ?? none;

  const ratio = new Float64Array(storeys === undefined || height === undefined ? 0 : rows);
  for (let at = 0; at < ratio.length; at += 1) ratio[at] = height![at]! / storeys![at]!;
  const median = medianOf(ratio);
  const usual = median >= 2.5 && median <= 5;

  for (let at = 0; at < rows; at += 1) {
    const row = sizes.first_row[at]!;
    const n = storeysAt[at]!;
    const perStorey = heightAt[at]! / n;
    if (n >= 2 && (perStorey < HEIGHT_PER_STOREY.low || perStorey > HEIGHT_PER_STOREY.high)) {
      heightContradicted[at] = 1;
      const h = heightAt[at]!;
      const check = usual && perStorey >= 9 && perStorey <= 14 ? CHECKS.looksLikeFeet : CHECKS.heightStoreys;
      notes.add(check, row, h, `${short(h)} m over ${short(n)} storeys is ${short(perStorey)} m per storey`);
    }
    const plate = areaAt[at]! / n;
    if (n >= 2 && plate < SMALLEST_PLATE_M2) {
      storeysDoubted[at] = 1;
      notes.add(
        CHECKS.plateSmall,
        row,
        n,
        `${short(areaAt[at]!)} m² over ${short(n)} storeys is ${short(plate)} m² per storey`,
      );
    } else if (plate > 1.3 * plans.area_m2[at]!) {
      const message = `${short(plate)} m² per storey over a plan of ${short(plans.area_m2[at]!)} m²`;
      notes.add(CHECKS.plateLarge, row, areaAt[at]!, message);
    }
    const merged = sizes.merged_storeys[at]!;
    if (merged === 2 || (merged === 1 && plate > STOREYS_OF_UNITS.plate_m2)) {
      storeysOfUnits[at] = 1;
      const message =
        merged === 2
          ? `only units give storeys, ${short(n)} at most`
          : `${short(areaAt[at]!)} m² over ${short(n)} ${n === 1 ? 'storey' : 'storeys'} is ${short(plate)} m² per storey`;
      notes.add(CHECKS.storeysOfUnits, row, n, message);
    }
    const total = totalAt[at]!;
    const below = belowAt[at]!;
    if (Math.abs(n + below - total) > 1e-9) {
      notes.add(
        CHECKS.storeySum,
        row,
        total,
        `${short(n)} above and ${short(below)} below, but ${short(total)} in all`,
      );
    }
    const built = builtAt[at]!;
    const retrofitted = retrofittedAt[at]!;
    if (retrofitted < built) {
      retrofitDoubted[at] = 1;
      notes.add(CHECKS.retrofitFirst, row, retrofitted, `retrofitted ${retrofitted}, built ${built}`);
    }
    const count = countAt[at]!;
    if (count > 1) notes.add(CHECKS.campusRow, row, count, `the row stands for ${count} buildings`);
  }
  checkPlaces(sizes, plans, notes);
  const check =
    median >= 10 && median <= 13
      ? CHECKS.columnInFeet
      : median >= 0.7 && median <= 1.4
        ? CHECKS.columnInMetres
        : undefined;
  return {
    storeysDoubted,
    storeysOfUnits,
    heightContradicted,
    retrofitDoubted,
    ...(check === undefined ? {} : { column: { check, ratio: median } }),
  };
}

/** True in SQL of a building whose drawings are said to show no design, beside the coefficient of one [judgement: the number is the firmer]. */
export function undesignedSql(column: (name: string) => string): string {
  return `(${column('design_level')} = 'none' AND ${column('design_base_shear_coefficient')} > 0)`;
}

/** Notes every building whose design level and coefficient contradict each other; the level is left out when buildings are stored. */
export async function noteUndesigned(db: Database, mapping: Mapping): Promise<void> {
  const has = (name: string): boolean => mapping.columns.some(({ column }) => column.name === name);
  if (!has('design_level') || !has('design_base_shear_coefficient')) return;
  const check = CHECKS.levelNone;
  await db.run(
    `INSERT INTO intake_finding
     SELECT first_row, id, ?, 'none', ?, 'no design for earthquakes, but a design base shear coefficient of ' || CAST(design_base_shear_coefficient AS VARCHAR), ?, 'note'
     FROM intake_building WHERE ${undesignedSql(quoteName)}`,
    [check.column, check.code, check.action],
  );
}

function checkPlaces(sizes: Sizes, plans: Plans, notes: BuildingNotes): void {
  const { lon, lat } = plans;
  const middleLon = medianOf(lon);
  const middleLat = medianOf(lat);
  for (let at = 0; at < sizes.rowCount; at += 1) {
    const x = lon[at]!;
    const y = lat[at]!;
    if (Number.isNaN(x) && Number.isNaN(y)) continue;
    const near = Math.abs(x - middleLon) <= 2 && Math.abs(y - middleLat) <= 2;
    if (near) continue;
    // A swapped latitude may lie beyond 90 degrees: its cell is rejected, and only the longitude is left to tell.
    const swapped = Math.abs(x - middleLat) <= 1 && !(Math.abs(y - middleLon) > 1);
    const check = x === 0 && y === 0 ? CHECKS.zeroPlace : swapped ? CHECKS.swappedPlace : CHECKS.farPlace;
    if (!Number.isNaN(y) || swapped) {
      const message = `(${x}, ${y}) where the inventory lies about (${short(middleLon)}, ${short(middleLat)})`;
      notes.add(check, sizes.first_row[at]!, x, message);
    }
    lon[at] = NaN;
    lat[at] = NaN;
  }
}

// Enough digits to see the contradiction.
function short(value: number): string {
  return String(Number(value.toPrecision(4)));
}
