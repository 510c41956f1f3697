/** A small study that uses every kind of entry; invented. */
export const SAMPLE = `# An invented place.
title: Two streets (invented)
inventory:
  file: inventory.csv
  columns:
    id: Asset no.   # theirs
    height_m: {column: Height, unit: ft}
    site_class: Ground
words:
  use: {flats: residential}
hazard:
  spectra:
    design: {code: asce7-22-two-period, sds_g: 0.95, sd1_g: 0.42, tl_s: 8, return_period_years: 475}
    rare: {code: en1998-1-2004-elastic-type-1, ag_g: 0.5, ground: C, return_period_years: 2475}
    drawn: {code: table, periods_s: [0, 0.2, 1, 2], ordinates_g: [0.4, 1, 0.5, 0.25], interpolation: linear}
  levels:
    - {title: design level, by: site_class, spectra: {C: design}, otherwise: design}
    - {title: rare level, spectrum: rare}
code_history:
  place: Two streets (invented)
  family: us-ubc-asce7
  seismic_design_enforced_from: 1952
  editions:
    ubc-1949: {zone: 3}
    ubc-1997: {ca_g: 0.44, cv_g: 0.64, zone_factor: 0.4, nv: 1.0}
  detailing_from: {concrete-moment-frame: 1973}
`;
