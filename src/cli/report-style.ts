/** How the report looks on a screen, light or dark, and on paper. */
export const style = `
:root { color-scheme: light dark; --paper: #fff; --ink: #22252a; --soft: #5b626c; --line: #d5d8dd; --wash: #f5f6f8; --hand: #a33a12; --right: #23607d; }
@media (prefers-color-scheme: dark) { :root { --paper: #191b1f; --ink: #e6e8eb; --soft: #a5acb6; --line: #3a3f47; --wash: #22252b; --hand: #f0976c; --right: #84c1de; } }
* { box-sizing: border-box; }
body { margin: 0 auto; max-width: 60rem; padding: 1.5rem 1.25rem 3rem; background: var(--paper); color: var(--ink); font: 1rem/1.5 system-ui, "Segoe UI", Roboto, "Liberation Sans", sans-serif; overflow-wrap: break-word; }
h1 { font-size: 1.7rem; line-height: 1.2; margin: 0 0 0.75rem; }
h2 { font-size: 1.25rem; margin: 2.25rem 0 0.5rem; padding-bottom: 0.25rem; border-bottom: 2px solid var(--line); }
h2.book { border: 0; margin-top: 3rem; font-size: 1.4rem; }
h3 { font-size: 1.1rem; margin: 1.5rem 0 0.5rem; }
h4 { font-size: 1rem; font-weight: 500; margin: 0; }
p { margin: 0.4rem 0; max-width: 46rem; }
dl { margin: 0.5rem 0; }
dl > div { display: grid; grid-template-columns: 7rem minmax(0, 1fr); gap: 0 0.75rem; padding: 0.15rem 0; }
dt { color: var(--soft); }
dd { margin: 0; min-width: 0; }
code { font-family: ui-monospace, "Cascadia Mono", Consolas, "Liberation Mono", monospace; font-size: 0.9em; overflow-wrap: anywhere; }
math { font-size: 1.15em; }
.relation { overflow-x: auto; padding: 0.15rem 0 0.35rem; }
article { border: 1px solid var(--line); border-left: 4px solid var(--hand); border-radius: 4px; padding: 0.75rem 1rem; margin: 0.75rem 0; break-inside: avoid; }
article b { margin-right: 0.5rem; }
.verdict { color: var(--hand); font-weight: 600; }
.soft { color: var(--soft); }
.wide { overflow-x: auto; }
table { border-collapse: collapse; width: 100%; font-variant-numeric: tabular-nums; }
th, td { text-align: left; vertical-align: top; padding: 0.3rem 0.75rem 0.3rem 0; border-bottom: 1px solid var(--line); }
thead th { color: var(--soft); font-weight: 500; }
tbody th { font-weight: 500; }
tr.total > * { font-weight: 600; }
figure { margin: 0.75rem 0 0; max-width: 36rem; }
svg { display: block; width: 100%; height: auto; background: var(--wash); border-radius: 3px; }
svg text { fill: var(--soft); font-size: 12px; }
svg .grid { stroke: var(--line); }
svg path { fill: none; stroke-width: 2; }
svg path.hand { stroke: var(--hand); stroke-dasharray: 5 3; }
svg path.right { stroke: var(--right); }
svg circle.hand { fill: var(--hand); }
.key { font-size: 0.85rem; margin: 0.25rem 0 0; }
.key span { margin-right: 1.25rem; }
.key span::before { content: ""; display: inline-block; width: 1.5rem; margin-right: 0.4rem; vertical-align: 0.25em; border-top: 2px solid; }
.key .hand { color: var(--hand); }
.key .hand::before { border-top-style: dashed; }
.key .right { color: var(--right); }
footer { margin-top: 2.5rem; border-top: 2px solid var(--line); padding-top: 0.75rem; font-size: 0.9rem; color: var(--soft); }
@media (max-width: 34rem) {
  body { padding: 1rem 0.75rem 2rem; }
  article { padding: 0.6rem 0.7rem; }
  dl > div { grid-template-columns: minmax(0, 1fr); padding: 0.25rem 0; }
  svg text { font-size: 18px; }
}
@media print {
  :root { color-scheme: light; --paper: #fff; --ink: #000; --soft: #444; --line: #bbb; --wash: #fff; --hand: #8f2f0b; --right: #1b506a; }
  @page { margin: 18mm 16mm; }
  body { max-width: none; padding: 0; font-size: 10.5pt; }
  h2, h3 { break-after: avoid; }
  tr { break-inside: avoid; }
  .wide { overflow: visible; }
}
`;
