/** Guesses at what an owner's words mean; each is a question in the proposed study, never applied by itself. */

const USE_GUESSES: readonly (readonly [RegExp, string])[] = [
  [/\b(vacant|undeveloped|parking.?lot|land|open.?space)\b/i, 'no building'],
  [/hotel|motel|inn\b/i, 'hotel'],
  [/hospital|clinic|nursing/i, 'hospital'],
  [/fire|police|emergency/i, 'emergency'],
  [/school|college|universit|classroom|education|teaching|day.?care/i, 'school'],
  [/lab|research|science/i, 'laboratory'],
  [/church|theat|assembly|auditorium|museum|library|gym|relig|gathering|meeting|hall\b/i, 'assembly'],
  [/warehouse|whse|storage|store.?house/i, 'warehouse'],
  [/manufact|industr|factory|workshop|\bworks\b/i, 'industrial'],
  [/garage|parking|car.?(deck|park)/i, 'parking'],
  [/retail|store|shop|restaurant|supermarket/i, 'retail'],
  [/office|bank|admin/i, 'office'],
  [/apt|apart|condo|fam|dwelling|resid|flat|house|board|dorm|>.*unit/i, 'residential'],
];

/** The use that words like these most likely mean, `no building` for a site without one, or undefined. [judgement] */
export function guessUse(text: string): string | undefined {
  return USE_GUESSES.find(([pattern]) => pattern.test(text))?.[1];
}

// The first that fits: what is said of a wall or a frame beside its material comes before the material alone.
const SYSTEM_GUESSES: readonly (readonly [RegExp, string])[] = [
  [/tilt/i, 'precast-tilt-up-wall'],
  [/pre.?cast/i, 'precast-concrete-frame'],
  [/confined|\btied\b|tie.?column/i, 'confined-masonry-wall'],
  [/(concrete|\br\.?c\.?\b).*(infill|in-fill|brick)/i, 'concrete-infilled-frame'],
  [/(concrete|\br\.?c\.?\b).*((wall|core).*frame|frame.*(wall|core)|dual)/i, 'concrete-wall-frame'],
  [/(concrete|\br\.?c\.?\b).*(wall|core)/i, 'concrete-shear-wall'],
  [/(concrete|\br\.?c\.?\b).*frame/i, 'concrete-moment-frame'],
  [/eccentric|off.?set.?brac/i, 'steel-eccentric-braced-frame'],
  [/buckling|sleeved brac/i, 'steel-buckling-restrained-braced-frame'],
  [/(light|cold).*steel|steel.*(light|cold)/i, 'steel-light-frame'],
  [/steel.*brac|brac.*steel/i, 'steel-concentric-braced-frame'],
  [/steel.*frame|frame.*steel/i, 'steel-moment-frame'],
  [/(unreinforced|\bun-?reinf).*(masonry|brick|block)|\burm\b/i, 'unreinforced-masonry-wall'],
  [/reinforced.*(masonry|brick|block)/i, 'reinforced-masonry-wall'],
  [/(timber|wood).*(post|beam|column|heavy)|heavy timber/i, 'timber-post-and-beam'],
  [/timber|wood|stud/i, 'timber-light-frame'],
  [/masonry|brick|stone|adobe|rubble/i, 'unreinforced-masonry-wall'],
];

/** The lateral system that words like these most likely mean, or undefined. [judgement] */
export function guessSystem(text: string): string | undefined {
  return SYSTEM_GUESSES.find(([pattern]) => pattern.test(text))?.[1];
}
