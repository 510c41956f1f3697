// P(structure | use, storeys, era): invented. Chances are hundredths, so that each group sums to exactly 100.

export const priorHeaders = ['use', 'storeys_from', 'storeys_to', 'built_from', 'built_to', 'system', 'chance'];

const urm = 'unreinforced-masonry-wall';
const timber = 'timber-light-frame';
const post = 'timber-post-and-beam';
const frame = 'concrete-moment-frame';
const infill = 'concrete-infilled-frame';
const wall = 'concrete-shear-wall';
const dual = 'concrete-wall-frame';
const precast = 'precast-concrete-frame';
const tilt = 'precast-tilt-up-wall';
const block = 'reinforced-masonry-wall';
const tied = 'confined-masonry-wall';
const steel = 'steel-moment-frame';
const braced = 'steel-concentric-braced-frame';
const eccentric = 'steel-eccentric-braced-frame';
const restrained = 'steel-buckling-restrained-braced-frame';
const light = 'steel-light-frame';

// use, storeys from, to, built from, to, then system and hundredths in turn
const groups = [
  ['residential', '', 3, '', 1944, urm, 55, timber, 40, post, 5],
  ['residential', '', 3, 1945, '', timber, 66, block, 10, tied, 9, wall, 5, light, 6, infill, 4],
  ['residential', 4, 7, '', 1944, urm, 72, infill, 20, timber, 4, steel, 4],
  ['residential', 4, 7, 1945, 1985, infill, 34, frame, 22, wall, 22, tied, 10, block, 12],
  ['residential', 4, 7, 1986, '', wall, 38, dual, 12, timber, 20, light, 14, block, 12, frame, 4],
  ['residential', 8, '', '', 1985, infill, 30, frame, 32, wall, 34, steel, 4],
  ['residential', 8, '', 1986, '', wall, 50, dual, 42, restrained, 4, steel, 4],
  ['hotel', '', '', '', 1950, urm, 60, infill, 30, steel, 10],
  ['hotel', '', '', 1951, '', frame, 25, wall, 45, dual, 22, steel, 8],
  ['office', '', '', '', 1949, urm, 62, infill, 22, steel, 16],
  ['office', '', 7, 1950, 1985, frame, 38, steel, 30, precast, 16, wall, 16],
  ['office', 8, '', 1950, 1985, steel, 52, frame, 34, wall, 14],
  ['office', '', '', 1986, '', steel, 26, restrained, 20, eccentric, 14, braced, 14, dual, 26],
  ['school', '', '', '', 1944, urm, 80, infill, 12, timber, 8],
  ['school', '', '', 1945, 1985, frame, 34, precast, 18, wall, 16, steel, 10, block, 12, tied, 10],
  ['school', '', '', 1986, '', dual, 26, restrained, 26, braced, 24, wall, 14, block, 10],
  ['hospital', '', '', '', '', frame, 36, wall, 40, restrained, 14, steel, 10],
  ['retail', '', '', '', 1945, urm, 66, timber, 32, post, 2],
  ['retail', '', '', 1946, '', infill, 16, frame, 18, block, 32, light, 14, tilt, 12, timber, 8],
  ['assembly', '', '', '', 1945, urm, 88, post, 8, infill, 4],
  ['laboratory', '', '', '', 1985, frame, 55, wall, 35, steel, 10],
  ['laboratory', '', '', 1986, '', eccentric, 26, restrained, 26, braced, 24, wall, 24],
  ['industrial', '', '', '', 1940, urm, 50, post, 38, braced, 12],
  ['industrial', '', '', 1941, '', braced, 38, light, 26, tied, 16, tilt, 20],
  ['warehouse', '', '', '', 1940, urm, 52, post, 44, steel, 4],
  ['warehouse', '', '', 1941, '', tilt, 46, light, 20, precast, 20, braced, 14],
  ['parking', '', '', '', '', precast, 50, frame, 36, braced, 14],
  ['emergency', '', '', '', '', block, 48, frame, 36, urm, 6, wall, 10],
  ['', '', '', '', 1945, urm, 70, timber, 18, infill, 12],
  ['', '', 3, 1946, '', block, 24, timber, 18, frame, 20, braced, 14, light, 12, wall, 12],
  ['', '', '', '', '', frame, 30, wall, 26, infill, 12, steel, 14, dual, 10, urm, 8],
];

/** Rows of system-prior.csv. Throws where a group does not sum to one. */
export function priorRows() {
  const rows = [];
  for (const [use, from, to, builtFrom, builtTo, ...pairs] of groups) {
    let sum = 0;
    for (let i = 0; i < pairs.length; i += 2) {
      sum += pairs[i + 1];
      rows.push([use, `${from}`, `${to}`, `${builtFrom}`, `${builtTo}`, pairs[i], (pairs[i + 1] / 100).toFixed(2)]);
    }
    if (sum !== 100) throw new Error(`system prior: group ${[use, from, to, builtFrom, builtTo].join('/')} sums to ${sum} hundredths; it must be 100`);
  }
  return rows;
}
