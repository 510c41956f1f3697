// Kinds of building: use, storeys, years, plan, spacing along the street, and which structure its era gave it. Invented, but believable.
// systems: [from year, to year, least storeys, most storeys, system, weight]. gap: how close it stands to the next lot.

const house = 'house';
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

const kind = (use, storeys, years, width, depth, gap, systems, more = {}) => ({ use, storeys, years, width, depth, gap, systems, ...more });

export const kinds = {
  terraceHouse: kind(house, [2, 4], [1882, 1938], [6, 9], [9, 12], 'shared', [[1880, 1950, 1, 4, urm, 7], [1880, 1950, 1, 3, timber, 3]]),
  cottages: kind(house, [1, 2], [1880, 1925], [12, 18], [7, 9], 'open', [[1880, 1950, 1, 2, urm, 6], [1880, 1950, 1, 2, post, 4]]),
  timberHouse: kind(house, [1, 3], [1921, 2019], [9, 14], [9, 13], 'open', [[1880, 2024, 1, 3, timber, 8], [1990, 2024, 1, 3, light, 1], [1955, 2024, 1, 2, block, 1]]),
  oldFlats: kind('flats', [4, 6], [1896, 1943], [14, 20], [12, 16], 'tight', [[1880, 1944, 1, 6, urm, 7], [1924, 1950, 4, 7, infill, 4]]),
  midFlats: kind('flats', [3, 9], [1948, 1985], [16, 26], [12, 17], 'tight',
    [[1945, 1985, 3, 9, infill, 4], [1950, 1985, 3, 9, frame, 3], [1955, 1985, 3, 9, wall, 3], [1945, 1985, 3, 4, tied, 4], [1955, 1985, 3, 5, block, 3]], { openFront: 0.25 }),
  newFlats: kind('flats', [4, 18], [1987, 2024], [18, 30], [15, 20], 'open',
    [[1986, 2024, 5, 18, wall, 5], [1990, 2024, 7, 18, dual, 6], [1995, 2024, 3, 5, light, 3], [1990, 2024, 3, 5, timber, 3], [1986, 2024, 4, 6, block, 2]], { openFront: 0.12 }),
  shopHouse: kind('shop', [2, 4], [1886, 1974], [7, 12], [12, 17], 'tight',
    [[1880, 1946, 1, 4, urm, 6], [1880, 1960, 1, 3, timber, 3], [1938, 1974, 2, 4, infill, 3], [1946, 1974, 2, 4, frame, 3]], { openFront: 0.5 }),
  midOffices: kind('offices', [3, 9], [1953, 1985], [18, 32], [14, 20], 'tight', [[1950, 1985, 3, 9, frame, 4], [1953, 1985, 4, 9, steel, 4], [1960, 1985, 3, 7, precast, 2], [1950, 1985, 5, 9, wall, 2]]),
  newOffices: kind('offices', [5, 22], [1986, 2023], [24, 36], [20, 30], 'open',
    [[1986, 2024, 5, 22, steel, 3], [1988, 2024, 6, 18, eccentric, 3], [2003, 2024, 5, 22, restrained, 6], [1986, 2024, 8, 22, dual, 5], [1986, 2024, 5, 9, braced, 2]]),
  tower: kind('offices', [17, 22], [1974, 2021], [30, 38], [28, 32], 'open', [[1970, 2002, 10, 24, steel, 1], [2003, 2024, 10, 24, restrained, 1], [1986, 2024, 10, 24, dual, 2]]),
  offices: kind('offices', [3, 4], [1899, 1931], [18, 24], [14, 18], 'tight', [[1880, 1944, 1, 5, urm, 1]]),
  oldWarehouse: kind('store house', [1, 4], [1880, 1933], [16, 30], [14, 24], 'tight', [[1880, 1940, 1, 4, urm, 5], [1880, 1940, 1, 4, post, 5]]),
  newWarehouse: kind('store house', [1, 2], [1962, 2021], [30, 52], [22, 34], 'open', [[1962, 2024, 1, 2, tilt, 5], [1970, 2024, 1, 1, light, 2], [1962, 2005, 1, 2, precast, 2], [1962, 2024, 1, 2, braced, 1]]),
  works: kind('works', [1, 3], [1904, 2016], [18, 40], [16, 30], 'open',
    [[1880, 1935, 1, 2, urm, 4], [1880, 1935, 1, 3, post, 3], [1936, 2024, 1, 3, braced, 4], [1960, 2024, 1, 2, light, 3], [1945, 1985, 1, 2, tied, 3], [1965, 2024, 1, 2, tilt, 2]]),
  inn: kind('inn', [4, 14], [1908, 2018], [20, 30], [15, 20], 'open', [[1880, 1940, 4, 6, urm, 3], [1925, 1952, 4, 8, infill, 3], [1950, 1985, 4, 12, frame, 3], [1955, 2024, 5, 14, wall, 3], [1988, 2024, 6, 14, dual, 3]]),
  carDeck: kind('car deck', [3, 6], [1962, 2011], [34, 48], [28, 34], 'open', [[1960, 2024, 3, 6, precast, 5], [1960, 2024, 3, 6, frame, 3], [1990, 2024, 3, 6, braced, 2]]),
  store: kind('shop', [1, 2], [1957, 2020], [20, 34], [18, 28], 'open', [[1955, 2024, 1, 2, block, 5], [1970, 2024, 1, 1, light, 3], [1965, 2024, 1, 2, tilt, 2]]),
  ferryHall: kind('gathering', [2, 2], [1994, 1999], [44, 48], [26, 30], 'open', [[1880, 2024, 1, 2, eccentric, 1]]),
  chapel: kind('gathering', [1, 1], [1884, 1912], [12, 16], [22, 28], 'open', [[1880, 1950, 1, 2, urm, 1]]),
  civicHall: kind('gathering', [2, 3], [1898, 1930], [22, 30], [22, 30], 'open', [[1880, 1950, 1, 3, urm, 1]]),
  sportsHall: kind('gathering', [1, 2], [1971, 1976], [38, 42], [28, 32], 'campus', [[1880, 2024, 1, 2, block, 1]]),
  readingRoom: kind('mixed', [4, 4], [1964, 1969], [32, 38], [24, 28], 'campus', [[1880, 2024, 1, 5, frame, 1]]),
  rescue: kind('fire and rescue', [2, 2], [1958, 1989], [22, 28], [14, 18], 'open', [[1950, 2024, 1, 3, block, 3], [1950, 1985, 1, 3, frame, 3]]),
  clinic: kind('clinic', [3, 7], [1956, 2008], [28, 42], [16, 20], 'open', [[1955, 1985, 3, 7, frame, 3], [1955, 2024, 3, 7, wall, 3], [2003, 2024, 3, 7, restrained, 3]]),
  school: kind('teaching', [2, 3], [1926, 1968], [34, 46], [14, 18], 'open', [[1880, 1945, 1, 3, urm, 3], [1946, 1985, 1, 3, tied, 3], [1955, 2024, 1, 3, block, 3]]),
  oldTeaching: kind('teaching', [3, 4], [1889, 1932], [26, 40], [14, 18], 'campus', [[1880, 1944, 1, 4, urm, 5], [1922, 1950, 3, 5, infill, 3]], { wing: 0.75 }),
  teaching: kind('teaching', [3, 6], [1955, 1984], [32, 46], [15, 20], 'campus', [[1950, 1985, 3, 7, frame, 4], [1960, 1985, 3, 6, precast, 3], [1955, 1985, 3, 7, wall, 2], [1955, 1985, 3, 6, steel, 2]], { wing: 0.5 }),
  newTeaching: kind('teaching', [4, 6], [1996, 2022], [34, 46], [18, 22], 'campus', [[1990, 2024, 3, 7, restrained, 3], [1990, 2024, 3, 7, dual, 3], [1990, 2024, 3, 6, braced, 2]]),
  science: kind('science', [3, 5], [1958, 1979], [34, 46], [16, 20], 'campus', [[1950, 1985, 3, 6, frame, 3], [1955, 1985, 3, 6, wall, 2]], { wing: 1 }),
  newScience: kind('science', [3, 6], [1988, 2021], [34, 46], [18, 24], 'campus', [[1986, 2024, 3, 6, braced, 2], [1988, 2024, 3, 6, eccentric, 3], [2003, 2024, 3, 6, restrained, 3], [1986, 2024, 3, 6, wall, 2]], { wing: 0.25 }),
  residence: kind('flats', [3, 11], [1936, 2014], [28, 40], [13, 16], 'campus', [[1925, 1950, 3, 5, infill, 3], [1950, 1985, 3, 9, infill, 3], [1955, 2024, 3, 11, wall, 4], [1955, 2000, 3, 4, block, 3], [1995, 2024, 3, 5, timber, 2]]),
};

/** Storey height by use, metres, before scatter. */
export const storeyHeights = {
  house: 2.9, flats: 3.05, inn: 3.35, offices: 3.8, teaching: 3.85, clinic: 4.2, shop: 3.5, gathering: 4.6, science: 4.1, works: 5.6, 'store house': 4.4, 'car deck': 3.1, 'fire and rescue': 3.9, mixed: 3.9,
};

/** People per square metre at the busiest hour and hours in use each week, by the owner's word for the use. */
export const crowds = {
  house: [0.03, 110], flats: [0.034, 112], inn: [0.028, 100], offices: [0.045, 50], teaching: [0.13, 42], clinic: [0.055, 120], shop: [0.06, 66], gathering: [0.22, 18],
  science: [0.034, 54], works: [0.015, 48], 'store house': [0.01, 50], 'car deck': [0.005, 24], 'fire and rescue': [0.03, 168], mixed: [0.06, 70],
};
