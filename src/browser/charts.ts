/** Charts compiled at report time, drawn with the runtime alone: no code is made from text. */
import type { Config, Spec } from 'vega';
import { parse, View } from 'vega';
import { expressionInterpreter } from 'vega-interpreter';
import { byId, el } from './dom.js';
import { unpackColumn } from './unpack.js';
import type { Packed } from './unpack.js';

interface PageChart {
  readonly id: string;
  readonly renderer: 'svg' | 'canvas';
  readonly vega: Spec;
  readonly data: Readonly<Record<string, Readonly<Record<string, Packed>>>>;
}

/** On a narrow page legends stand one under the other. */
const NARROW_PX = 640;
const STACKED: Config = { legend: { layout: { top: { anchor: 'start', direction: 'vertical', margin: 12 } } } };

interface Picking {
  /** Words shown at a building's mark. */
  readonly tip: (i: number) => string;
  readonly open: (i: number) => void;
}

/** Draws the charts of the page one after the other, leaving room between them; what is left, before printing. */
export function startCharts(json: string, picking: Picking): void {
  const waiting = [...(JSON.parse(json) as readonly PageChart[])];
  const next = (): boolean => {
    const chart = waiting.shift();
    if (chart !== undefined) keep(chart, picking);
    return waiting.length > 0;
  };
  const later = (): void => {
    setTimeout(() => {
      if (next()) later();
    }, 0);
  };
  later();
  addEventListener('beforeprint', () => {
    while (next());
  });
}

function keep(chart: PageChart, picking: Picking): void {
  let view = draw(chart, picking);
  if (chart.renderer === 'svg') return;
  // A canvas keeps the colours it was drawn with: draw it again when the scheme changes.
  matchMedia('(prefers-color-scheme: dark)').addEventListener('change', () => {
    view.finalize();
    view = draw(chart, picking);
  });
}

function draw(chart: PageChart, picking: Picking): View {
  const box = byId(`chart-${chart.id}`);
  const spec = chart.renderer === 'canvas' ? withColours(chart.vega) : chart.vega;
  const view = new View(parse(spec, box.clientWidth < NARROW_PX ? STACKED : undefined, { ast: true }), {
    renderer: chart.renderer,
    container: box,
    expr: expressionInterpreter,
    hover: false,
  });
  for (const [name, columns] of Object.entries(chart.data)) view.data(name, rowsOf(columns));
  pick(view, picking);
  // The box is one image with its own label: what is inside says nothing of its own.
  const settle = (): void => {
    box.dataset['drawn'] = 'yes';
    for (const inner of box.querySelectorAll('svg, canvas')) inner.setAttribute('aria-hidden', 'true');
    for (const inner of box.querySelectorAll('[role], [aria-roledescription], [aria-label], [tabindex]')) {
      for (const name of ['role', 'aria-roledescription', 'aria-label', 'tabindex']) inner.removeAttribute(name);
    }
  };
  view.run();
  settle();
  return view;
}

function rowsOf(columns: Readonly<Record<string, Packed>>): Record<string, unknown>[] {
  const entries = Object.entries(columns).map(([name, packed]) => [name, unpackColumn(packed)] as const);
  const count = entries[0]?.[1].length ?? 0;
  return Array.from({ length: count }, (_, r) =>
    Object.fromEntries(entries.map(([name, values]) => [name, values[r]])),
  );
}

/** The specification with the page's variables replaced by their present colours. */
function withColours(spec: Spec): Spec {
  const style = getComputedStyle(document.documentElement);
  return JSON.parse(
    JSON.stringify(spec).replaceAll(/var\((--[\w-]+)\)/g, (_, name: string) => style.getPropertyValue(name).trim()),
  ) as Spec;
}

/** One floating line for all charts; it repeats what the table says, so it stays out of the reading order. */
const tipBox = el('div', { class: 'tip', 'aria-hidden': 'true', hidden: '' });

function pick(view: View, { tip, open }: Picking): void {
  const placeOf = (item: unknown): number | null => {
    const i = (item as { readonly datum?: { readonly i?: unknown } } | null)?.datum?.i;
    return typeof i === 'number' ? i : null;
  };
  view.addEventListener('click', (_, item) => {
    const i = placeOf(item);
    if (i !== null) open(i);
  });
  view.addEventListener('mousemove', (event, item) => {
    const i = placeOf(item);
    tipBox.hidden = i === null;
    if (i === null || !(event instanceof MouseEvent)) return;
    if (!tipBox.isConnected) document.body.append(tipBox);
    tipBox.textContent = tip(i);
    tipBox.style.left = `${String(Math.max(4, Math.min(event.clientX + 14, innerWidth - tipBox.offsetWidth - 8)))}px`;
    tipBox.style.top = `${String(Math.max(4, Math.min(event.clientY + 14, innerHeight - tipBox.offsetHeight - 8)))}px`;
  });
  view.addEventListener('mouseout', () => {
    tipBox.hidden = true;
  });
}
