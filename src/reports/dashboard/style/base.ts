/** Colours, type and the frame of the page. Colours are one family of blues and one violet accent: no rating is meant by any. */
export const BASE_STYLE = `
:root {
  color-scheme: light dark;
  --paper: #fcfcfa; --panel: #f3f4f1; --ink: #1b2430; --ink-soft: #535f6d; --line: #d9dcd8;
  --mark: #2c5f8a; --mark-soft: #86a9c6; --mark-faint: #c3d3e0; --accent: #5b2a86;
  --step-1: #1f4e79; --step-2: #6d9dc5; --step-3: #c9dcec; --link: #1d4f7c; --chosen: #e9e4f1;
}
@media (prefers-color-scheme: dark) { :root {
  --paper: #14181d; --panel: #1d2329; --ink: #e7eaee; --ink-soft: #a6b0bb; --line: #353d46;
  --mark: #7db3e0; --mark-soft: #53789a; --mark-faint: #37495a; --accent: #c9a6ef;
  --step-1: #8fc0ea; --step-2: #4d7ba4; --step-3: #2b4259; --link: #9cc9f0; --chosen: #32283f;
} }
@media print { :root {
  color-scheme: light;
  --paper: #fff; --panel: #f6f6f4; --ink: #111; --ink-soft: #444; --line: #c9c9c9;
  --mark: #2c5f8a; --mark-soft: #86a9c6; --mark-faint: #c3d3e0; --accent: #5b2a86;
  --step-1: #1f4e79; --step-2: #6d9dc5; --step-3: #c9dcec; --link: #111; --chosen: #eee;
} }
* { box-sizing: border-box; }
html { scroll-behavior: smooth; scroll-padding-top: 1rem; -webkit-text-size-adjust: 100%; }
@media (prefers-reduced-motion: reduce) { html { scroll-behavior: auto; } * { transition: none !important; animation: none !important; } }
body {
  margin: 0; background: var(--paper); color: var(--ink);
  font: 16px/1.55 system-ui, -apple-system, "Segoe UI", Roboto, "Helvetica Neue", Arial, sans-serif;
  font-variant-numeric: tabular-nums; overflow-wrap: break-word;
}
h1, h2, h3 { font-family: Charter, "Bitstream Charter", "Sitka Text", Cambria, Georgia, serif; font-weight: 600; line-height: 1.2; text-wrap: balance; }
h1 { font-size: clamp(1.7rem, 4.5vw, 2.5rem); margin: 0 0 .3rem; }
h2 { font-size: clamp(1.3rem, 3vw, 1.6rem); margin: 0 0 .6rem; }
h3 { font-size: 1.08rem; margin: 1.6rem 0 .4rem; }
p { margin: 0 0 .8rem; max-width: 72ch; }
a { color: var(--link); text-underline-offset: 2px; }
:focus-visible { outline: 3px solid var(--accent); outline-offset: 2px; border-radius: 2px; }
.frame { max-width: 1180px; margin: 0 auto; padding: 0 clamp(1rem, 4vw, 2.5rem); }
.skip { position: absolute; left: -999rem; top: 0; background: var(--paper); padding: .6rem 1rem; z-index: 5; }
.skip:focus { left: .5rem; top: .5rem; }
.quiet { color: var(--ink-soft); font-size: .92rem; }
.unseen { position: absolute; width: 1px; height: 1px; overflow: hidden; clip-path: inset(50%); white-space: nowrap; }
header.top { border-top: 6px solid var(--mark); padding: 2rem 0 0; }
.kicker { margin: 0 0 .5rem; color: var(--ink-soft); font-size: .92rem; max-width: none; }
.answer {
  font: 600 clamp(1.2rem, 2.9vw, 1.6rem)/1.35 Charter, "Bitstream Charter", "Sitka Text", Cambria, Georgia, serif;
  margin: 1.2rem 0 1rem; max-width: 46ch; text-wrap: pretty;
}
.two { display: grid; grid-template-columns: minmax(0, 3fr) minmax(0, 2fr); gap: 1rem 3rem; align-items: start; }
.two > * { min-width: 0; }
.careful { border-left: 4px solid var(--ink); padding: .1rem 0 .1rem 1rem; margin: 0 0 1.2rem; }
.careful h2 { font-size: 1.05rem; margin-bottom: .3rem; }
.careful ul { margin: 0; padding-left: 1.1rem; font-size: .95rem; }
nav.contents { border-block: 1px solid var(--line); margin: 1.4rem 0 0; }
nav.contents ul { display: flex; flex-wrap: wrap; gap: .1rem 1.3rem; list-style: none; margin: 0; padding: .45rem 0; }
nav.contents a { display: inline-block; padding: .2rem 0; }
section { padding: 2.2rem 0 .6rem; }
section + section { border-top: 1px solid var(--line); }
footer { border-top: 1px solid var(--line); margin-top: 2rem; padding: 1.2rem 0 3rem; color: var(--ink-soft); font-size: .92rem; }
ol.plain, ul.plain { margin: 0; padding-left: 1.2rem; max-width: 78ch; }
code { font: .92em ui-monospace, "SF Mono", Menlo, Consolas, "DejaVu Sans Mono", monospace; overflow-wrap: anywhere; }
@media (max-width: 760px) { .two { grid-template-columns: minmax(0, 1fr); } section { padding-top: 1.6rem; } }
@media print {
  body { font-size: 10pt; } .frame { max-width: none; padding: 0; }
  nav.contents, .skip, .screen-only, noscript { display: none !important; }
  section { padding: 1rem 0 .3rem; } h2, h3, figure { break-after: avoid; } figure, tr { break-inside: avoid; }
  a { text-decoration: none; }
  body:has(dialog[open]) > :not(dialog) { display: none; }
  dialog[open] { position: static !important; max-height: none !important; width: auto !important; border: 0 !important; }
}
`;
