/** Outlines as well-known text (OGC 06-103r4, from memory): a polygon, or several that are one building. */
import type { Point } from './plan-shape.js';

/** An outline: the outer ring, then the courtyards; none closed. */
export type Rings = readonly (readonly Point[])[];

/** What comes before the first ring. Heights and measures behind longitude and latitude are read over. */
const HEAD = /^\s*(?:SRID=4326;\s*)?(MULTI)?POLYGON\s*(?:(?:ZM?|M)\s*)?(?=\()/i;
/** Longitude, latitude, height, measure. */
const MOST_NUMBERS = 4;

/**
 * Reads `POLYGON ((lon lat, …), (hole), …)` or `MULTIPOLYGON (((lon lat, …), (hole), …), …)` in degrees: the outlines in their order, at
 * least one; undefined when it is none. In one pass: a cell may hold 100,000 characters of anything.
 */
export function readOutlines(text: string): readonly Rings[] | undefined {
  const head = HEAD.exec(text);
  if (head === null) return undefined;
  const at = new Place(text, head[0].length);
  const outlines = head[1] === undefined ? oneOf(readOutline(at)) : readList(at, readOutline);
  return outlines !== undefined && at.isEnd() ? outlines : undefined;
}

function oneOf<T>(item: T | undefined): readonly T[] | undefined {
  return item === undefined ? undefined : [item];
}

/** How far the text is read. */
class Place {
  readonly #text: string;
  #at: number;

  constructor(text: string, at: number) {
    this.#text = text;
    this.#at = at;
  }

  /** Goes past `mark` and what is blank before it, where it comes next. */
  take(mark: '(' | ')' | ','): boolean {
    this.#skipBlank();
    if (this.#text[this.#at] !== mark) return false;
    this.#at += 1;
    return true;
  }

  /** What stands before the next closing bracket. */
  upToClose(): string | undefined {
    const end = this.#text.indexOf(')', this.#at);
    if (end < 0) return undefined;
    const inner = this.#text.slice(this.#at, end);
    this.#at = end;
    return inner;
  }

  isEnd(): boolean {
    this.#skipBlank();
    return this.#at === this.#text.length;
  }

  #skipBlank(): void {
    while (this.#at < this.#text.length && this.#text[this.#at]!.trim() === '') this.#at += 1;
  }
}

/** Items in brackets with commas between. */
function readList<T>(at: Place, readItem: (at: Place) => T | undefined): readonly T[] | undefined {
  if (!at.take('(')) return undefined;
  const items: T[] = [];
  do {
    const item = readItem(at);
    if (item === undefined) return undefined;
    items.push(item);
  } while (at.take(','));
  return at.take(')') ? items : undefined;
}

function readOutline(at: Place): Rings | undefined {
  return readList(at, readRing);
}

function readRing(at: Place): readonly Point[] | undefined {
  if (!at.take('(')) return undefined;
  const inner = at.upToClose();
  if (inner === undefined || !at.take(')')) return undefined;
  const points: Point[] = [];
  for (const place of inner.split(',')) {
    const numbers = place.trim().split(/\s+/).map(Number);
    const [x, y] = numbers;
    if (x === undefined || y === undefined || numbers.length > MOST_NUMBERS) return undefined;
    if (numbers.some((n) => !Number.isFinite(n))) return undefined;
    points.push([x, y]);
  }
  const last = points.at(-1);
  // The closing point repeats the first.
  if (points.length > 1 && last?.[0] === points[0]?.[0] && last?.[1] === points[0]?.[1]) points.pop();
  return points.length >= 3 ? points : undefined;
}
