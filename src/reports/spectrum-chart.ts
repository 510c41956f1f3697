/** The picture of spectra: S_a over the period, each curve with a colour and a dash of its own. */
import { formatNumber } from '../engineering/format.js';
import { LINE, MARK, SOFT, svgOf } from './picture.js';

export interface DrawnPoint {
  readonly period_s: number;
  readonly sa_g: number;
  /** Longer than the publication covers. */
  readonly beyond: boolean;
}

export interface DrawnSpectrum {
  readonly name: string;
  /** Code, clause or title: what the curve is. */
  readonly about: string;
  readonly points: readonly DrawnPoint[];
  readonly plateau: { readonly from_s: number; readonly to_s: number; readonly sa_g: number };
  readonly corners_s: readonly number[];
  /** Points read and asked for by name, shown as dots. */
  readonly read: readonly DrawnPoint[];
}

const WIDTH = 680;
const HEIGHT = 340;
// Told apart by dash and by lightness as well as by hue; none of them red or green.
const INKS = [LINE, MARK, '#111111', '#7a4a9e', '#0b8a99', SOFT];
const DASHES = [[1, 0], [7, 3], [2, 3], [9, 3, 2, 3], [4, 2], [12, 4]];
/** Corners marked in the picture of one spectrum: a table has one at every period. */
const MOST_CORNERS = 8;
/** More curves than this cannot be told apart. */
export const MOST_DRAWN = INKS.length;

/** What the picture says, in words. */
export function spectraSentence(spectra: readonly DrawnSpectrum[]): string {
  const last = Math.max(...spectra.flatMap(({ points }) => points.map(({ period_s }) => period_s)));
  const each = spectra.map(({ name, plateau, read, points }) => {
    const asked = read.map(({ period_s, sa_g }) => `, ${formatNumber(sa_g)} g at ${formatNumber(period_s)} s`).join('');
    const beyond = points.find((point) => point.beyond);
    const end = beyond === undefined ? '' : `; fainter where the period is longer than the publication covers`;
    return `${name}: ${plateauWords(plateau)}${asked}${end}`;
  });
  return `Spectral acceleration over period from 0 to ${formatNumber(last)} s. ${each.join('. ')}.`;
}

function plateauWords({ from_s, to_s, sa_g }: DrawnSpectrum['plateau']): string {
  if (!(to_s > from_s)) return `largest ordinate ${formatNumber(sa_g)} g at ${formatNumber(from_s)} s`;
  return `plateau of ${formatNumber(sa_g)} g from ${formatNumber(from_s)} to ${formatNumber(to_s)} s`;
}

/** The picture as SVG text; at most MOST_DRAWN spectra. */
export async function spectraSvg(spectra: readonly DrawnSpectrum[]): Promise<string> {
  const title = spectra.map(({ name }) => name).join(', ');
  const several = spectra.length > 1;
  const subtitle = spectra.map(
    ({ name, about, plateau }) => `${several ? `${name}: ` : ''}${about}; ${plateauWords(plateau)}`,
  );
  const last = Math.max(...spectra.flatMap(({ points }) => points.map(({ period_s }) => period_s)));
  const within = (spectra[0]?.corners_s ?? []).filter((period_s) => period_s <= last);
  const corners = several || within.length > MOST_CORNERS ? [] : within;
  if (corners.length > 0) subtitle.push('dotted: where one branch ends and the next begins');
  const names = spectra.map(({ name }) => name);
  const rows = (pick: (one: DrawnSpectrum) => readonly DrawnPoint[]): readonly object[] =>
    spectra.flatMap((one) => pick(one).map((point) => ({ ...point, name: one.name })));
  const x = { field: 'period_s', type: 'quantitative', title: 'Period T (s)', scale: { nice: false, zero: true }, axis: { tickCount: 8 } };
  const y = { field: 'sa_g', type: 'quantitative', title: 'Spectral acceleration S_a (g)', scale: { zero: true } };
  const legend = several ? { title: null, orient: 'top', symbolType: 'stroke', symbolSize: 900, labelFontSize: 12, labelLimit: 300 } : null;
  const color = { field: 'name', type: 'nominal', sort: null, scale: { domain: names, range: INKS.slice(0, names.length) }, legend };
  const strokeDash = { field: 'name', type: 'nominal', sort: null, scale: { domain: names, range: DASHES.slice(0, names.length) }, legend };
  const dots = rows(({ read }) => read);
  const spec = {
    title: { text: title, subtitle: subtitle.map((line) => (line.length > 125 ? `${line.slice(0, 124)}…` : line)) },
    width: WIDTH,
    height: HEIGHT,
    layer: [
      ...(corners.length === 0
        ? []
        : [
            {
              data: { values: corners.map((period_s) => ({ period_s })) },
              mark: { type: 'rule', color: SOFT, strokeWidth: 1, strokeDash: [1, 3] },
              encoding: { x },
            },
          ]),
      ...[false, true].flatMap((beyond) => {
        const values = rows(({ points }) => points.filter((point) => point.beyond === beyond));
        if (values.length === 0) return [];
        const mark = { type: 'line', strokeWidth: 2, interpolate: 'linear', opacity: beyond ? 0.4 : 1 };
        return [{ data: { values }, mark, encoding: { x, y, color, strokeDash } }];
      }),
      ...(dots.length === 0
        ? []
        : [{ data: { values: dots }, mark: { type: 'point', filled: true, size: 46, opacity: 1 }, encoding: { x, y, color } }]),
    ],
  };
  return svgOf(spec, title, spectraSentence(spectra));
}
