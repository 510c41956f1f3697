/** Does the building's period come close to that of the ground? */
import type { FormulaSink } from '../formula.js';
import { apply } from '../formula.js';
import { SITE_RATIO } from './records.js';

/** Bands of closeness used with microtremors (after Gosar 2010), from memory: within 15 %, within 25 %. */
const CLOSE = 0.15;
const NEAR = 0.25;
/** Periods lengthen by a tenth to a half in strong shaking: from here a stiffer building grows into the ground's period [judgement]. */
const GROWS_FROM = 0.7;

export type Closeness = 'close' | 'near' | 'grows-into' | 'apart';

/** How close `period_s` is to `site_period_s`; null where either is not known. */
export function siteCloseness(period_s: number, site_period_s: number, trace?: FormulaSink): Closeness | null {
  if (!(period_s > 0) || !(site_period_s > 0)) return null;
  const ratio = apply(SITE_RATIO, { period_s, site_period_s }, trace);
  const gap = Math.abs(ratio - 1);
  if (gap <= CLOSE) return 'close';
  if (gap <= NEAR) return 'near';
  return ratio >= GROWS_FROM && ratio < 1 ? 'grows-into' : 'apart';
}
