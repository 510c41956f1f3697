/** A range on a logarithmic scale as a bar with a mark: a picture beside the numbers that say the same. */
import { el } from '../dom.js';

export interface BarScale {
  readonly low_s: number;
  readonly high_s: number;
}

/** The scale that holds all of `values`, a tenth wider on both sides. */
export function scaleOf(values: readonly number[]): BarScale {
  const known = values.filter((value) => value > 0 && Number.isFinite(value));
  return { low_s: Math.min(...known) / 1.1, high_s: Math.max(...known) * 1.1 };
}

/** The bar from `low_s` to `high_s` with its mark at `middle_s`; hidden from screen readers, which read the numbers. */
export function bar(scale: BarScale, low_s: number, middle_s: number, high_s: number, strong: boolean): HTMLElement {
  const place = (value: number): number => (100 * Math.log(value / scale.low_s)) / Math.log(scale.high_s / scale.low_s);
  const range = el('span', { class: strong ? 'bar strong' : 'bar' });
  range.style.left = `${place(low_s).toFixed(2)}%`;
  range.style.width = `${(place(high_s) - place(low_s)).toFixed(2)}%`;
  const mark = el('span', { class: 'bar-mark' });
  mark.style.left = `${place(middle_s).toFixed(2)}%`;
  return el('span', { class: 'bars', 'aria-hidden': 'true' }, range, mark);
}
