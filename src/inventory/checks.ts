/** The contradiction checks: what each one tests and what it leads to. Nothing is corrected: a hit is a note. */
export interface Check {
  readonly code: string;
  readonly column: string;
  readonly test: string;
  readonly action: string;
}

function check(code: string, column: string, test: string, action: string): Check {
  return { code, column, test, action };
}

export const CHECKS = {
  heightStoreys: check(
    'height-storeys-contradict',
    'height_m',
    'two storeys or more and a height per storey outside 2.3 to 6.5 m',
    'both kept; the spread of the height is widened to 0.35',
  ),
  looksLikeFeet: check(
    'looks-like-feet',
    'height_m',
    'height per storey of 9 to 14 m where the median of the column is 2.5 to 5 m',
    'not converted; the spread of the height is widened to 0.35',
  ),
  columnInFeet: check('column-looks-like-feet', 'height_m', 'median height per storey of 10 to 13 m', 'not converted'),
  columnInMetres: check(
    'column-looks-like-metres',
    'height_m',
    'median height per storey of 0.7 to 1.4 m',
    'not converted',
  ),
  plateSmall: check(
    'floor-plate-small',
    'storeys_above',
    'two storeys or more and less than 25 m² of floor area per storey',
    'the storeys are treated as unknown',
  ),
  plateLarge: check(
    'floor-plate-large',
    'floor_area_m2',
    'floor area per storey above 1.3 times the footprint',
    'kept as given',
  ),
  storeySum: check(
    'storeys-do-not-add-up',
    'storeys_total',
    'above plus below is not the total',
    'storeys above ground kept as given',
  ),
  retrofitFirst: check(
    'retrofit-before-construction',
    'year_retrofitted',
    'the year of retrofit is before the year of construction',
    'the year of retrofit is treated as unknown',
  ),
  levelNone: check(
    'coefficient-without-design',
    'design_level',
    'design_level none, no design for earthquakes, beside a design coefficient above 0',
    'the coefficient is taken and its level counts as not stated; leave the coefficient blank, or give its level',
  ),
  yearHeap: check(
    'year-heaping',
    'year_built',
    '1800 or 1900 at least 5 times and more than 3 times as often as each of the five years on either side on average',
    'kept as given; the era is uncertain',
  ),
  campusRow: check(
    'several-buildings-in-row',
    'count',
    'count above 1',
    'ranked as one building; the result is per row',
  ),
  zeroPlace: check('coordinates-zero', 'lon', 'longitude and latitude both 0', 'left off the map'),
  swappedPlace: check(
    'coordinates-swapped',
    'lon',
    'longitude within 1° of the median latitude and latitude within 1° of the median longitude, or out of range',
    'left off the map',
  ),
  farPlace: check('coordinates-far', 'lon', 'more than 2° from the median of the inventory', 'left off the map'),
  nearTwin: check(
    'near-duplicate',
    'id',
    'coordinates equal to five decimals and the same floor area',
    'both kept; look whether they are one building',
  ),
  mainUnknown: check(
    'unknown-main-building',
    'part_of',
    'part_of names no building of the inventory',
    'the building stands by itself; give the identifier of its main building',
  ),
  partOfItself: check(
    'part-of-itself',
    'part_of',
    'part_of names the building itself',
    'taken as a main building; leave its own cell blank',
  ),
  partOfPart: check(
    'part-of-a-part',
    'part_of',
    'part_of names a building that is itself part of another',
    'counted to the site where the chain ends; name the main building',
  ),
  partOfCircle: check(
    'part-of-in-a-circle',
    'part_of',
    'following part_of leads back to the building',
    'taken together as one site; leave the cell of the main building blank',
  ),
  storeysDisagree: check(
    'storeys-disagree',
    'storeys_above',
    'rows of one building give different storeys',
    'the largest is taken',
  ),
  storeysOfUnits: check(
    'storeys-of-units',
    'storeys_above',
    'rows merged into one building, and more than 5000 m² of floor area per storey, or 8 units or more that alone give storeys, 2 at most',
    'the storeys are kept with spread 0.40, because they may be those of a unit; give the storeys of the building',
  ),
  yearsDisagree: check(
    'years-disagree',
    'year_built',
    'rows of one building give different years',
    'the earliest is taken',
  ),
  wordsDisagree: check(
    'words-disagree',
    'use',
    'rows of one building give different words',
    'the word with the largest floor area is taken',
  ),
  partLooksWhole: check(
    'part-looks-like-whole',
    'floor_area_m2',
    'of three rows or more of one building one gives 0.75 to 1.5 times the area of the others together',
    'summed; the spread of the floor area is widened to 0.35, because it may be counted twice',
  ),
  listsDiffer: check(
    'lists-differ',
    'wall_areas_longitudinal_m2',
    'as many wall areas as wall lengths in a direction, and one storey stiffness or one a storey',
    'kept; what needs the two together is not worked out',
  ),
  partsWithoutArea: check(
    'parts-without-area',
    'floor_area_m2',
    'some rows of one building give no area',
    'the areas known are summed, with spread 0.20',
  ),
} as const satisfies Readonly<Record<string, Check>>;

export const HEIGHT_PER_STOREY = { low: 2.3, high: 6.5 } as const;
export const SMALLEST_PLATE_M2 = 25;
/** Where the storeys of merged rows may be those of units [judgement]. */
export const STOREYS_OF_UNITS = { plate_m2: 5000, units: 8, storeys: 2 } as const;
