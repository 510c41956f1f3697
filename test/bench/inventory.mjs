// A seeded inventory of any size, streamed to a CSV file: invented, for measuring only.
import { createWriteStream } from 'node:fs';
import { once } from 'node:events';

const SYSTEMS = [
  'concrete-moment-frame',
  'concrete-shear-wall',
  'unreinforced-masonry-wall',
  'timber-light-frame',
  'steel-moment-frame',
  'reinforced-masonry-wall',
  'concrete-infilled-frame',
  'steel-concentric-braced-frame',
];
const USES = ['residential', 'office', 'school', 'retail', 'hotel', 'warehouse', 'industrial', 'hospital'];

/** Linear congruential numbers (Numerical Recipes constants): the same on every machine. */
function numbers(seed) {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296;
  };
}

/** Ten storey stiffnesses, kN/m, falling towards the roof. */
function chain(random) {
  const first = 200000 + random() * 300000;
  return Array.from({ length: 10 }, (_, s) => Math.round(first * (1 - 0.05 * s))).join(';');
}

/** Writes `rows` buildings: a fifth with the system unknown, a quarter without a height, a tenth without a year. */
export async function writeInventory(path, rows, { seed = 20260611, chains = false } = {}) {
  const random = numbers(seed);
  const pick = (list) => list[Math.floor(random() * list.length)];
  const out = createWriteStream(path);
  out.write(
    `id,name,block,lon,lat,storeys,height_m,length_m,width_m,area_m2,year,system,use,site,occupants${chains ? ',k_along,k_across' : ''}\n`,
  );
  let text = '';
  for (let i = 0; i < rows; i += 1) {
    // every second building is of ten storeys where chains are asked for
    const tall = chains && i % 2 === 0;
    const storeys = tall ? 10 : 1 + Math.floor(random() * random() * 14);
    const height = (storeys * (2.9 + random() * 1.2)).toFixed(1);
    const length = (10 + random() * 50).toFixed(1);
    const width = (8 + random() * 18).toFixed(1);
    const area = Math.round(storeys * Number(length) * Number(width));
    const system = random() < 0.2 ? '' : pick(SYSTEMS);
    const year = random() < 0.1 ? '' : 1890 + Math.floor(random() * 133);
    text += `B${String(i).padStart(7, '0')},Building ${i},block ${Math.floor(random() * 400)},${(-40 + random() * 0.3).toFixed(6)},${(35 + random() * 0.3).toFixed(6)},${storeys},${random() < 0.25 ? '' : height},${length},${width},${area},${year},${system},${pick(USES)},${pick(['B', 'C', 'D'])},${random() < 0.3 ? Math.round(area * 0.03) : ''}${chains ? `,${tall ? chain(random) : ''},${tall ? chain(random) : ''}` : ''}\n`;
    if (text.length > 1 << 20) {
      if (!out.write(text)) await once(out, 'drain');
      text = '';
    }
  }
  out.end(text);
  await once(out, 'finish');
}

export const STUDY = `title: Bench (invented)
inventory:
  file: inventory.csv
  columns:
    id: id
    name: name
    group: block
    lon: lon
    lat: lat
    storeys_above: storeys
    height_m: height_m
    plan_length_m: length_m
    plan_width_m: width_m
    floor_area_m2: area_m2
    year_built: year
    system: system
    use: use
    site_class: site
    occupants_peak: occupants
hazard:
  spectra:
    b: {code: asce7-22-two-period, sds_g: 0.7, sd1_g: 0.3, tl_s: 8, return_period_years: 475}
    c: {code: asce7-22-two-period, sds_g: 0.82, sd1_g: 0.42, tl_s: 8, return_period_years: 475}
    d: {code: asce7-22-two-period, sds_g: 0.86, sd1_g: 0.56, tl_s: 8, return_period_years: 475}
    b2: {code: asce7-22-two-period, sds_g: 1.37, sd1_g: 0.6, tl_s: 8, return_period_years: 2475}
    c2: {code: asce7-22-two-period, sds_g: 1.5, sd1_g: 0.82, tl_s: 8, return_period_years: 2475}
    d2: {code: asce7-22-two-period, sds_g: 1.42, sd1_g: 1.0, tl_s: 8, return_period_years: 2475}
  levels:
    - {title: design, by: site_class, spectra: {B: b, C: c, D: d}, otherwise: d}
    - {title: rare, by: site_class, spectra: {B: b2, C: c2, D: d2}, otherwise: d2}
code_history:
  place: Bench (invented)
  family: us-ubc-asce7
  seismic_design_enforced_from: 1952
  editions:
    ubc-1949: {zone: 3}
    ubc-1961: {zone_factor: 1.0}
    ubc-1976: {zone_factor: 1.0, site_factor: 1.5}
    ubc-1988: {zone_factor: 0.4, site_factor: 1.2}
    ubc-1997: {ca_g: 0.44, cv_g: 0.64, zone_factor: 0.4, nv: 1.0}
    asce7-2002: {sds_g: 1.0, sd1_g: 0.6, s1_g: 0.6}
system_prior: system-prior.csv
ranking: {rank_by: people, list_size: 100}
output: reports
`;

export const PRIOR = `use,storeys_from,storeys_to,built_from,built_to,system,chance
,,3,,1940,unreinforced-masonry-wall,0.6
,,3,,1940,timber-light-frame,0.4
,,3,,,timber-light-frame,0.5
,,3,,,reinforced-masonry-wall,0.3
,,3,,,concrete-shear-wall,0.2
,,,,,concrete-moment-frame,0.5
,,,,,concrete-shear-wall,0.3
,,,,,steel-moment-frame,0.2
`;
