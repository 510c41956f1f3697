/** The end of a hand calculation: every case at its central values, the mixture, its median. */
import type { Building } from '../building.js';
import { formatNumber, formatShare } from '../format.js';
import type { Mixture } from '../priority/mixture.js';
import type { Trace } from '../trace.js';
import type { Case, Cases } from './case-memory.js';
import type { SpectrumChoice } from './choose-spectrum.js';
import type { AssessContext } from './context.js';
import { REGULAR, irregularityOf, storeyChanceOf } from './irregularity.js';
import { leadingCase, scoreOf } from './leading.js';
import { spreadShares } from './spread-shares.js';
import { drawingsLevels, levelNotStated } from './terms.js';

interface Closing {
  readonly building: Building;
  readonly cases: Cases;
  readonly choice: SpectrumChoice;
  readonly slope_k: number;
  readonly context: AssessContext;
  readonly mixture: Mixture;
  readonly lnPriority: number;
  readonly sd: number;
}

/** Cases written out one by one; the rest are counted. */
const SHOWN = 12;
/** Shares of the spread under this are left out. */
const LEAST_SHARE = 0.005;

export function closeTrace(trace: Trace, closing: Closing): void {
  const { building, cases, choice, context, mixture, lnPriority, sd } = closing;
  trace.heading('From the leading case to the priority');
  const why =
    cases.prior === null
      ? 'system given; era by year of construction, lag and enforcement'
      : cases.systemKnown
        ? `system given; years of like buildings by its chance in each: ${cases.prior}`
        : `system chances: ${cases.prior}`;
  const shown = shownCases(closing);
  shown.slice(0, SHOWN).forEach((one, i) => {
    trace.value(
      `case ${String(i + 1)} of ${String(shown.length)}`,
      caseWords(one, closing),
      cases.systemKnown ? 'given' : 'prior',
      why,
    );
  });
  if (shown.length > SHOWN) {
    const rest = shown.slice(SHOWN).reduce((sum, { chance }) => sum + chance, 0);
    trace.value('further cases', String(shown.length - SHOWN), 'prior', `together ${formatShare(rest)}`);
  }
  if (shown.length > cases.list.length)
    trace.value(
      "level of the drawings' coefficient",
      'working stress 50 %, strength 50 %',
      'prior',
      'the drawings do not say: every case counts twice, once at either level',
    );
  irregularWords(trace, closing);
  for (let i = mixture.from; i < mixture.to; i += 1) {
    trace.value(
      `part ${String(i - mixture.from + 1)} of the distribution of ln S`,
      `weight ${formatNumber(mixture.weight[i]!, 4)}, mean ${formatNumber(mixture.mean[i]!, 5)}, standard deviation ${formatNumber(mixture.sd[i]!, 4)}`,
      'computed',
      'gathered from all cases, the nodes of period and height, and the soft or weak storey where it is not known; strength, era, the other irregularities and people make the standard deviation',
    );
  }
  const shares = spreadShares(building, choice.spectrum, context);
  const [largest, ...others] = shares ?? [];
  if (largest !== undefined) {
    trace.choice({
      question: 'Where the spread comes from',
      taken: `${largest.what}: ${formatShare(largest.share)} of the spread`,
      because: `the largest share of the variance of ln S${largest.learnable ? ', which a visit can find out' : ', which no visit settles'}; unknowns that tell part of the same overlap, and may add up to more than the whole`,
      others: others
        .filter(({ share }) => share >= LEAST_SHARE)
        .map(({ what, share, learnable }) => ({
          also: true,
          what,
          why: `${formatShare(share)}${learnable ? ', a visit can find it out' : ''}`,
        })),
    });
  }
  trace.value('ln_priority_sd', sd, 'computed', 'standard deviation of the whole distribution');
  trace.value(
    'ln_priority',
    lnPriority,
    'computed',
    context.settings.rankBy === 'demand'
      ? 'ln of the larger S_a of the two directions at their median periods'
      : 'median: the ln S at which Σ weight × Φ((ln S - mean) / standard deviation) is one half',
  );
}

/** What a soft or weak storey does in a case where it is not known whether there is one. */
function irregularWords(trace: Trace, { building, cases, slope_k, context }: Closing): void {
  const without = context.settings.rankBy === 'demand' || building.capacity_sa_g > 0;
  const irregularity = without ? REGULAR : irregularityOf(building, context);
  const { frame, wall } = irregularity.storeyChance;
  const open = cases.list.some((which) => {
    const chance = storeyChanceOf(irregularity, which);
    return chance > 0 && chance < 1;
  });
  if (!open) return;
  trace.value(
    'soft or weak storey',
    `ln S higher by ${formatNumber(-slope_k * irregularity.lnStorey, 4)} with one; chance ${formatShare(frame)} where a frame stands, ${formatShare(wall)} elsewhere`,
    'prior',
    'every case counts twice, without one and with one, each with its chance: a blank is not the best case',
  );
}

/** A case as it is written out: at one level of the drawings' coefficient, where the drawings do not say which. */
interface ShownCase {
  readonly which: Case;
  readonly building: Building;
  readonly level: string;
  readonly chance: number;
}

/** All cases, by falling chance; twice as many where the level of the drawings' coefficient is open. */
function shownCases({ building, cases, context }: Closing): readonly ShownCase[] {
  const open = context.settings.rankBy !== 'demand' && levelNotStated(building);
  return cases.list.flatMap((which): readonly ShownCase[] =>
    open
      ? (['working', 'strength'] as const).map((design_level, i) => ({
          which,
          building: { ...building, design_level },
          level: ['; coefficient at working stress', '; coefficient at strength level'][i]!,
          chance: which.chance * drawingsLevels(building)[i]!.chance,
        }))
      : [{ which, building, level: '', chance: which.chance }],
  );
}

/** One case at its central values. */
function caseWords(
  { which, building, level, chance }: ShownCase,
  { cases, choice, slope_k, context }: Closing,
): string {
  const systems = `${which.system}${which.system_transverse === which.system ? '' : ` / ${which.system_transverse}`}`;
  const built = which.builtTo === null ? '' : `, built to ${which.builtTo.edition ?? 'no seismic design'}`;
  const name = `${systems}, ${which.edition ?? 'no seismic design'}${built}${level}`;
  const share = `chance ${formatShare(chance)}`;
  const worked = leadingCase(building, { ...cases, list: [which] }, choice, slope_k, context);
  if (typeof worked === 'string') return `${name}: ${share}`;
  const score = scoreOf(building, worked.sa_g, worked.capacity_g, slope_k, choice.spectrum, context);
  const capacity = Number.isNaN(worked.capacity_g) ? '' : `, C = ${formatNumber(worked.capacity_g, 4)} g`;
  return `${name}: ${share}; S_a = ${formatNumber(worked.sa_g, 4)} g${capacity}, central ln S = ${formatNumber(score, 4)}`;
}
