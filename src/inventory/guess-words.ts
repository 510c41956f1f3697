/** Guesses at what an owner's words mean; each is a question in the proposed study, never applied by itself. */

const USE_GUESSES: readonly (readonly [RegExp, string])[] = [
  [/\b(vacant|undeveloped|parking.?lot|land|open.?space)\b/i, 'no building'],
  [/hotel|motel|inn\b/i, 'hotel'],
  [/hospital|clinic|nursing/i, 'hospital'],
  [/fire|police|emergency/i, 'emergency'],
  [/school|college|universit|classroom|education|day.?care/i, 'school'],
  [/lab|research/i, 'laboratory'],
  [/church|theat|assembly|auditorium|museum|library|gym|relig|hall\b/i, 'assembly'],
  [/warehouse|whse|storage/i, 'warehouse'],
  [/manufact|industr|factory|workshop/i, 'industrial'],
  [/garage|parking/i, 'parking'],
  [/retail|store|shop|restaurant|supermarket/i, 'retail'],
  [/office|bank|admin/i, 'office'],
  [/apt|apart|condo|fam|dwelling|resid|flat|house|board|dorm|>.*unit/i, 'residential'],
];

/** The use that words like these most likely mean, `no building` for a site without one, or undefined. [judgement] */
export function guessUse(text: string): string | undefined {
  return USE_GUESSES.find(([pattern]) => pattern.test(text))?.[1];
}
