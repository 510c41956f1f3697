/** Invented study settings for tests of the engineering: three site classes, a code history, a table of system chances. */
import type { AssessSettings, Spreads } from '../../src/engineering/assess/settings.js';
import { IRREGULARITY, SPREADS } from '../../src/engineering/assess/settings.js';
import type { SystemPriorGroup } from '../../src/engineering/prior/system-prior.js';

const group = (
  label: string,
  bounds: Partial<SystemPriorGroup>,
  chances: SystemPriorGroup['chances'],
): SystemPriorGroup => ({
  use: null,
  storeysFrom: null,
  storeysTo: null,
  builtFrom: null,
  builtTo: null,
  label,
  chances,
  ...bounds,
});

/** Invented chances. */
export const PRIOR: readonly SystemPriorGroup[] = [
  group('low, before 1940', { storeysTo: 3, builtTo: 1939 }, [
    { system: 'unreinforced-masonry-wall', chance: 0.6 },
    { system: 'timber-light-frame', chance: 0.4 },
  ]),
  group('low, 1940 on', { storeysTo: 3, builtFrom: 1940 }, [
    { system: 'reinforced-masonry-wall', chance: 0.35 },
    { system: 'timber-light-frame', chance: 0.3 },
    { system: 'concrete-shear-wall', chance: 0.2 },
    { system: 'steel-concentric-braced-frame', chance: 0.15 },
  ]),
  group('higher, before 1980', { storeysFrom: 4, builtTo: 1979 }, [
    { system: 'concrete-moment-frame', chance: 0.4 },
    { system: 'concrete-infilled-frame', chance: 0.25 },
    { system: 'concrete-shear-wall', chance: 0.2 },
    { system: 'steel-moment-frame', chance: 0.15 },
  ]),
  group('any', {}, [
    { system: 'concrete-shear-wall', chance: 0.5 },
    { system: 'steel-moment-frame', chance: 0.3 },
    { system: 'concrete-moment-frame', chance: 0.2 },
  ]),
];

export const SETTINGS: AssessSettings = {
  spectra: {
    rock: { code: 'asce7-22-two-period', sds_g: 0.8, sd1_g: 0.3, tl_s: 8, return_period_years: 475 },
    firm: { code: 'asce7-22-two-period', sds_g: 1, sd1_g: 0.6, tl_s: 8, return_period_years: 475 },
    soft: { code: 'asce7-22-two-period', sds_g: 0.95, sd1_g: 0.9, tl_s: 8, return_period_years: 475 },
  },
  levels: [{ title: '475 years', by: 'site_class', spectra: { B: 'rock', C: 'firm', D: 'soft' }, otherwise: 'firm' }],
  holdPlateau: true,
  period: { standard: 'asce7-22', basis: 'best-fit', formulaFor: {}, switchedOff: [] },
  codeHistory: {
    place: 'invented',
    seismic_design_enforced_from: 1952,
    adoption_lag_years: 2,
    editions: {
      'ubc-1949': { zone: 3 },
      'ubc-1961': { zone_factor: 1 },
      'ubc-1976': { zone_factor: 1, site_factor: 1.2 },
      'ubc-1988': { zone_factor: 0.4, site_factor: 1.2 },
      'ubc-1997': { ca_g: 0.44, cv_g: 0.64, zone_factor: 0.4, nv: 1 },
      'asce7-2002': { sds_g: 1, sd1_g: 0.6, s1_g: 0.6 },
    },
  },
  systemPrior: PRIOR,
  rankBy: 'people',
  slope: 2.5,
  slopeSource: 'assumed',
  spreads: SPREADS,
  irregularity: IRREGULARITY,
};

/** Every spread 0: the drawn inputs are taken as they are. */
export const NO_SPREADS: Spreads = Object.fromEntries(
  Object.keys(SPREADS).map((name) => [name, 0]),
) as unknown as Spreads;
