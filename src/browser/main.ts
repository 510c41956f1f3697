/** The dashboard's client: charts, table of all buildings, building sheet. */
import { formatCount, formatQuantity, formatShare } from '../engineering/format.js';
import { startCharts } from './charts.js';
import { byId } from './dom.js';
import { startClasses } from './estimates/classes.js';
import { portfolioOf } from './portfolio.js';
import type { Portfolio } from './portfolio.js';
import { startSheet } from './sheet/sheet.js';
import { startTable } from './table/table.js';
import { unpackPage } from './unpack.js';

function tipOf(p: Portfolio, i: number): string {
  if (p.text('not_ranked', i) !== '') return `${p.label(i)}\nnot ranked: ${p.text('not_ranked', i)}`;
  const quantity = (value: number, unit: string): string => formatQuantity(value, unit, p.page.display, 3);
  return [
    p.label(i),
    `rank ${formatCount(p.number('rank', i))}, chance of belonging ${formatShare(p.number('chance', i))}`,
    `T ${quantity(p.period_s(i), 's')}, Sₐ ${quantity(p.number('sa_g', i), 'g')}, height ${quantity(p.input('height_m', i), 'm')}`,
  ].join('\n');
}

const charts = byId('page-charts').textContent;
const data = document.getElementById('page-data');
// The page of a comparison has charts, and no table of buildings.
if (data === null) startCharts(charts, { tip: () => '', open: () => undefined });
else {
  const portfolio = portfolioOf(unpackPage(data.textContent));
  startTable(portfolio);
  startClasses(portfolio);
  const open = startSheet(portfolio);
  startCharts(charts, { tip: (i) => tipOf(portfolio, i), open });
}
