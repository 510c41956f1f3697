/** Pictures drawn without a display, in plain colours: one frame, font and set of inks for all. */
import { View, parse } from 'vega';
import { compile } from 'vega-lite';
import type { Config, TopLevelSpec } from 'vega-lite';

const INK = '#1d2733';
export const SOFT = '#5b6b7b';
export const LINE = '#1f5a8c';
export const MARK = '#8a4b08';
const GRID = '#e1e6eb';
const FONT = 'system-ui, "Segoe UI", Roboto, "Helvetica Neue", Arial, sans-serif';
const CONFIG: Config = {
  background: '#ffffff',
  font: FONT,
  padding: 12,
  view: { stroke: 'transparent' },
  axis: {
    labelColor: SOFT,
    titleColor: INK,
    domainColor: SOFT,
    tickColor: SOFT,
    gridColor: GRID,
    labelFontSize: 12,
    titleFontSize: 12.5,
    titleFontWeight: 600,
    titlePadding: 10,
  },
  title: { anchor: 'start', color: INK, fontSize: 15, fontWeight: 600, subtitleColor: SOFT, subtitleFontSize: 12, offset: 12 },
};

// File and column names are the owner's: no markup, and nothing an XML reader refuses.
function xmlText(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replace(/[\p{Cc}\ufffe\uffff]/gu, ' ');
}

/** A chart as SVG text that carries its title and what it says in words. */
export async function svgOf(spec: object, title: string, sentence: string): Promise<string> {
  const view = new View(parse(compile(spec as TopLevelSpec, { config: CONFIG }).spec), { renderer: 'none' });
  const svg = await view.toSVG();
  view.finalize();
  const words = `<title>${xmlText(title)}</title><desc>${xmlText(sentence)}</desc>`;
  return `${svg.replace(/<svg([^>]*)>/, (_all, rest: string) => `<svg role="img"${rest.replace(/ role="[^"]*"/, '')}>${words}`)}\n`;
}
