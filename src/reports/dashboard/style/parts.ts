/** Tables, charts and the building sheet. */
export const PARTS_STYLE = `
.scroll { overflow: auto; max-width: 100%; border: 1px solid var(--line); border-radius: 4px; }
table { border-collapse: collapse; width: 100%; font-size: .92rem; }
caption { text-align: left; padding: .5rem .7rem; color: var(--ink-soft); }
th, td { padding: .38rem .7rem; text-align: left; vertical-align: top; border-bottom: 1px solid var(--line); }
th { font-weight: 600; } thead th { background: var(--panel); border-bottom: 1px solid var(--ink-soft); vertical-align: bottom; }
tbody tr:last-child > * { border-bottom: 0; }
.num { text-align: right; } td.num { white-space: nowrap; }
th.name { min-width: 9rem; } tbody th.name { font-weight: 400; } th.name a, td.name a { font-weight: 600; } td.name { min-width: 10rem; } td.reason { min-width: 10rem; }
#list-table th, #list-table td { padding-inline: .5rem; }
#survey td:nth-child(2), #survey td:nth-child(5), #survey td:nth-child(6) { min-width: 10rem; }
ul.bare { list-style: none; margin: 0; padding: 0; } td.members { min-width: 17rem; }
#gaps-table td:last-child { min-width: 11rem; } #gaps-table thead th.num { min-width: 5.5rem; }
#sites-table thead th.num { min-width: 6rem; }
.no-blocks tr > :nth-child(3) { display: none; }
.scroll.long { max-height: min(80vh, 52rem); } .scroll.long thead th { position: sticky; top: 0; z-index: 1; }
tr.edge > * { border-bottom: 2px dashed var(--ink); }
figure { margin: 1.2rem 0 1.6rem; }
figure > figcaption { font-weight: 600; margin-bottom: .2rem; }
.chart { width: 100%; min-height: 60px; margin: .6rem 0 .2rem; overflow: hidden; }
.chart svg, .chart canvas { display: block; max-width: 100%; }
.chart.points svg, .chart.points canvas { cursor: pointer; }
.tip {
  position: fixed; z-index: 4; pointer-events: none; max-width: 22rem; padding: .4rem .6rem; font-size: .86rem; white-space: pre-line;
  background: var(--ink); color: var(--paper); border-radius: 4px;
}
details { margin: .3rem 0 .8rem; } summary { cursor: pointer; color: var(--link); padding: .15rem 0; width: fit-content; }
details .scroll { max-height: 24rem; margin-top: .4rem; }
.tools { display: flex; flex-wrap: wrap; gap: .6rem 1.4rem; align-items: end; margin-bottom: .7rem; }
.tools label { display: grid; gap: .15rem; font-size: .92rem; font-weight: 600; }
input[type=search], select {
  font: inherit; font-weight: 400; padding: .4rem .6rem; min-height: 2.5rem; max-width: 100%; color: var(--ink); background: var(--paper);
  border: 1px solid var(--ink-soft); border-radius: 4px;
}
input[type=search] { width: min(24rem, 82vw); }
.status { margin: 0; align-self: center; color: var(--ink-soft); font-size: .92rem; }
#all-region { max-height: min(70vh, 46rem); overscroll-behavior: contain; }
#all-region table { width: max-content; min-width: 100%; border-collapse: separate; border-spacing: 0; }
#all-region th, #all-region td { white-space: nowrap; height: 36px; padding-block: 0; vertical-align: middle; }
#all-region td { max-width: 20rem; overflow: hidden; text-overflow: ellipsis; }
#all-region thead th { position: sticky; top: 0; z-index: 1; padding: 0; }
#all-region tr.spacer td { height: 0; padding: 0; border: 0; }
th button { font: inherit; font-weight: 600; color: inherit; background: none; border: 0; padding: .5rem .7rem; width: 100%; text-align: inherit; cursor: pointer; }
th button::after { content: " ↕"; color: var(--ink-soft); font-weight: 400; }
th[aria-sort=ascending] button::after { content: " ↑"; color: var(--ink); } th[aria-sort=descending] button::after { content: " ↓"; color: var(--ink); }
tr.listed > * { background: var(--chosen); }
.guess { color: var(--ink-soft); font-style: italic; }
dialog {
  width: min(60rem, calc(100vw - 1.5rem)); max-height: calc(100dvh - 2rem); padding: 0; color: var(--ink); background: var(--paper);
  border: 1px solid var(--ink-soft); border-radius: 6px; overflow: auto;
}
dialog::backdrop { background: rgb(10 14 20 / .55); }
.sheet { padding: 1rem clamp(1rem, 3vw, 2rem) 2rem; }
.sheet-head { display: flex; gap: 1rem; justify-content: space-between; align-items: start; position: sticky; top: 0; background: var(--paper); padding: 1rem 0 .6rem; border-bottom: 1px solid var(--line); margin-top: -1rem; z-index: 1; }
.sheet-head h2 { margin: 0; overflow-wrap: anywhere; }
button.plain { font: inherit; padding: .4rem .9rem; min-height: 2.5rem; color: var(--ink); background: var(--panel); border: 1px solid var(--ink-soft); border-radius: 4px; cursor: pointer; white-space: nowrap; }
.facts { display: grid; grid-template-columns: minmax(9rem, max-content) minmax(0, 1fr); gap: .25rem 1.2rem; margin: .4rem 0 .8rem; }
.facts dt { color: var(--ink-soft); } .facts dd { margin: 0; overflow-wrap: anywhere; }
ol.hand { list-style: none; margin: .4rem 0; padding: 0; font-size: .94rem; }
ol.hand > li { padding: .5rem 0; border-bottom: 1px solid var(--line); }
ol.hand > li.heading { font-weight: 600; border-bottom: 1px solid var(--ink-soft); padding-top: 1.1rem; }
ol.hand .maths { font: .93em/1.6 ui-monospace, "SF Mono", Menlo, Consolas, "DejaVu Sans Mono", monospace; margin: .15rem 0 .15rem 1rem; overflow-wrap: anywhere; }
ol.hand .result { font-weight: 600; }
ol.hand .from { color: var(--ink-soft); font-size: .92em; margin-left: 1rem; }
.estimates .from { color: var(--ink-soft); font-size: .88em; font-weight: 400; } .estimates th[scope=row] { font-weight: 400; min-width: 14rem; } .estimates td:last-child { min-width: 14rem; }
.bars { position: relative; display: block; height: .7rem; min-width: 9rem; margin-top: .25rem; }
.bar { position: absolute; top: .25rem; height: .2rem; background: var(--mark-soft); border-radius: 2px; } .bar.strong { top: .15rem; height: .4rem; background: var(--accent); }
.bar-mark { position: absolute; top: 0; width: 2px; height: .7rem; background: var(--ink); print-color-adjust: exact; }
.agrees { border: 1px solid var(--ink-soft); border-radius: 4px; padding: .5rem .8rem; overflow-wrap: anywhere; }
@media (min-width: 861px) { .narrow-only { display: none; } }
@media print { .narrow-only { display: none; } }
@media (max-width: 560px) { .facts { grid-template-columns: minmax(0, 1fr); gap: 0; } .facts dd { margin-bottom: .45rem; } th, td { padding-inline: .5rem; } }
@media print {
  .scroll { overflow: visible; border: 0; max-height: none !important; } details:not([open]), summary { display: none; } table { font-size: 8.5pt; }
  th, td { padding: .2rem .35rem; } th.name { min-width: 0; } td.reason { min-width: 9rem; } #list-table th, #list-table td { padding-inline: .2rem; font-size: 8pt; } thead th { background: none; }
  .tip { display: none; } .chart svg { height: auto; } .sheet-head { position: static; }
}
`;
