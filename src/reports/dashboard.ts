/** The dashboard: one self-contained HTML file. */
import { Fragment, h } from 'preact';
import type { PageData } from '../engineering/page-contract.js';
import type { Chart } from './dashboard/charts/chart.js';
import { compileChart } from './dashboard/charts/compile.js';
import { mapChart } from './dashboard/charts/map.js';
import { periodHeightChart } from './dashboard/charts/period-height.js';
import { provenanceChart } from './dashboard/charts/provenance.js';
import { rankedChart } from './dashboard/charts/ranked.js';
import { spectrumChart } from './dashboard/charts/spectrum.js';
import { packPage } from './dashboard/pack.js';
import { BudgetSection, SensitivitySection } from './dashboard/sections/decide.js';
import { MapSection, OriginsSection, PeriodsSection } from './dashboard/sections/figures.js';
import { GapsSection } from './dashboard/sections/gaps.js';
import { ListSection } from './dashboard/sections/list.js';
import { AllSection, AssumptionsSection, CautionsSection, Foot, InventorySection } from './dashboard/sections/records.js';
import { SitesSection } from './dashboard/sections/sites.js';
import { SurveySection } from './dashboard/sections/survey.js';
import { Top } from './dashboard/sections/top.js';
import { BASE_STYLE } from './dashboard/style/base.js';
import { PARTS_STYLE } from './dashboard/style/parts.js';
import { scriptJson } from './html.js';
import { renderPage } from './page.js';

export { readPageScript } from './page-script.js';

/**
 * The dashboard of a run as the text of an HTML file.
 * @param pageScript the built client (`readPageScript()`)
 */
export function renderDashboard(data: PageData, pageScript: string): string {
  const spectrum = spectrumChart(data);
  const heights = periodHeightChart(data);
  const map = mapChart(data);
  const provenance = provenanceChart(data);
  const ranked = rankedChart(data);
  const charts = [ranked, spectrum, heights, map, provenance].filter((chart): chart is Chart => chart !== null);
  const body = h(
    Fragment,
    null,
    h('a', { class: 'skip', href: '#list' }, 'Skip to the list'),
    h(
      'div',
      { class: 'frame' },
      h(Top, { data }),
      h(
        'main',
        null,
        h(ListSection, { data, chart: ranked }),
        h(PeriodsSection, { data, spectrum, heights }),
        h(MapSection, { chart: map }),
        h(OriginsSection, { chart: provenance }),
        h(SitesSection, { data }),
        h(GapsSection, { data }),
        h(SurveySection, { data }),
        h(BudgetSection, { data }),
        h(SensitivitySection, { data }),
        h(AllSection, { data }),
        h(InventorySection, { data }),
        h(AssumptionsSection, { data }),
        h(CautionsSection, { data }),
      ),
      h(Foot, { data }),
    ),
    h('dialog', { id: 'sheet', 'aria-labelledby': 'sheet-title' }),
  );
  return renderPage({
    title: `${data.summary.title}: which buildings first`,
    style: BASE_STYLE + PARTS_STYLE,
    script: pageScript,
    body,
    blocks: { 'page-data': scriptJson(packPage(data)), 'page-charts': scriptJson(charts.map(compileChart)) },
  });
}
