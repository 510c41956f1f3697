/** Where the rank numbers of the map stand, so that near neighbours keep theirs apart. */

interface Numbered {
  readonly i: number;
  readonly east: number;
  readonly north: number;
  readonly number: string;
}

/** Places tried around a mark, in pixels east and north, nearest to the reader's habit first. */
const PLACES: readonly (readonly [number, number])[] = [
  [13, 10],
  [13, -10],
  [-13, 10],
  [-13, -10],
  [0, 15],
  [0, -15],
  [26, 22],
  [26, -22],
  [-26, 22],
  [-26, -22],
];

/** `marks` with the place of their number instead of their own; `perPixel` is the length of a pixel at the usual width. */
export function placeNumbers(marks: readonly Numbered[], perPixel: number): readonly Numbered[] {
  const taken: { readonly east: number; readonly north: number }[] = [];
  return marks.map(({ i, east, north, number }) => {
    const clear = ([x, y]: readonly [number, number]): boolean => {
      const away = (other: { readonly east: number; readonly north: number }, wide: number, high: number): boolean =>
        Math.abs(other.east - east - x * perPixel) > wide * perPixel || Math.abs(other.north - north - y * perPixel) > high * perPixel;
      return taken.every((other) => away(other, 17, 12)) && marks.every((other) => other.i === i || away(other, 12, 11));
    };
    const [x, y] = PLACES.find(clear) ?? [13, 10];
    const place = { i, east: east + x * perPixel, north: north + y * perPixel, number };
    taken.push(place);
    return place;
  });
}
