/** Specifications compiled here, in Node; the page carries the result and the runtime only. */
import type { Config } from 'vega-lite';
import { compile } from 'vega-lite';
import { Bug } from '../../../errors.js';
import type { Chart } from './chart.js';

const FONT = 'system-ui, -apple-system, "Segoe UI", Roboto, "Helvetica Neue", Arial, sans-serif';

/** Colours are the page's own variables, so that a chart follows the light and the dark scheme. */
export const CHART_CONFIG: Config = {
  background: 'transparent',
  // The box around a chart carries one label; a description of every mark costs seconds on a large portfolio.
  aria: false,
  // Data sets are filtered where they are made.
  mark: { invalid: null },
  font: FONT,
  padding: 4,
  view: { stroke: 'transparent' },
  axis: {
    labelColor: 'var(--ink-soft)',
    titleColor: 'var(--ink)',
    domainColor: 'var(--ink-soft)',
    tickColor: 'var(--ink-soft)',
    gridColor: 'var(--line)',
    labelFontSize: 12,
    titleFontSize: 12.5,
    titleFontWeight: 600,
    titlePadding: 10,
    tickSize: 4,
  },
  legend: {
    labelColor: 'var(--ink)',
    titleColor: 'var(--ink)',
    labelFontSize: 12,
    titleFontSize: 12,
    orient: 'top',
    direction: 'horizontal',
    labelLimit: 320,
    symbolStrokeWidth: 2,
    columns: { expr: 'containerSize()[0] < 640 ? 1 : 4' },
    symbolBaseFillColor: 'var(--ink)',
    symbolBaseStrokeColor: 'var(--ink)',
    rowPadding: 4,
  },
  text: { color: 'var(--ink)', fontSize: 12 },
};

export interface CompiledChart {
  readonly id: string;
  readonly renderer: Chart['renderer'];
  readonly vega: unknown;
  readonly data: Chart['data'];
}

/** The chart as a Vega specification. @throws Bug when the specification draws a warning or an error. */
export function compileChart({ id, renderer, spec, data }: Chart): CompiledChart {
  const warnings: string[] = [];
  const logger = {
    level: () => logger,
    error: (...messages: unknown[]) => (warnings.push(messages.join(' ')), logger),
    warn: (...messages: unknown[]) => (warnings.push(messages.join(' ')), logger),
    info: () => logger,
    debug: () => logger,
  };
  const { spec: vega } = compile(spec, { config: CHART_CONFIG, logger });
  if (warnings.length > 0) throw new Bug(`chart ${id}: ${warnings.join('; ')}`);
  return { id, renderer, vega, data };
}
