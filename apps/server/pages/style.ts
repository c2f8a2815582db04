import { createHash } from 'node:crypto';

/** Paper and ink: one column, thin rules, one accent for what can be done. */
export const STYLE = `
@font-face { font-family: 'Gentium Plus'; src: url('/fonts/GentiumPlus-Regular.ttf'); font-display: swap; }
@font-face { font-family: 'Noto Sans'; src: url('/fonts/NotoSans-Regular.ttf'); font-display: swap; }
@font-face { font-family: 'Noto Sans'; font-weight: 700; src: url('/fonts/NotoSans-Bold.ttf'); font-display: swap; }
:root { --paper: #f8f4ea; --ink: #1f1b16; --faint: #5c5348; --rule: #c9bda6; --accent: #7d3414; }
* { box-sizing: border-box; }
html { background: var(--paper); color: var(--ink); font: 1rem/1.55 'Noto Sans', sans-serif; }
body { margin: 0 auto; padding: 1.5rem 1rem 4rem; max-width: 46rem; font-variant-numeric: tabular-nums; overflow-wrap: break-word; }
h1, h2, h3, .lead { font-family: 'Gentium Plus', serif; font-weight: 400; line-height: 1.25; margin: 0; }
h1 { font-size: 2.1rem; }
h2 { font-size: 1.5rem; margin-top: 2.75rem; padding-top: .6rem; border-top: 1px solid var(--ink); }
h3 { font-size: 1.2rem; }
p { margin: .5rem 0; }
a { color: var(--accent); text-underline-offset: .15em; }
:focus-visible { outline: 3px solid var(--accent); outline-offset: 2px; }
.club { letter-spacing: .04em; color: var(--faint); margin: 0 0 1.5rem; }
.lead { font-size: 1.55rem; margin: .4rem 0 0; }
.note { color: var(--faint); font-size: .92rem; }
.evenings { list-style: none; margin: 1rem 0 0; padding: 0; counter-reset: rank; }
.evenings > li { counter-increment: rank; border-top: 1px solid var(--rule); padding: .7rem 0 .8rem 2.4rem; position: relative; }
.evenings > li::before { content: counter(rank); position: absolute; left: 0; top: .7rem; color: var(--faint); }
.line { margin: 0; }
.points { white-space: nowrap; color: var(--faint); }
summary { cursor: pointer; padding: .35rem 0; color: var(--accent); }
dl { margin: .4rem 0; }
dt { font-weight: 700; }
dd { margin: 0 0 .4rem; }
table { border-collapse: collapse; width: 100%; margin: .5rem 0; }
.wide { overflow-x: auto; }
th, td { text-align: left; vertical-align: top; padding: .3rem .9rem .3rem 0; border-bottom: 1px solid var(--rule); }
th { font-weight: 700; }
.glossed > * { border-bottom: 0; padding-bottom: 0; }
.gloss td { font-size: .92rem; color: var(--faint); padding-top: 0; }
form { margin: .5rem 0 0; }
form.row { display: flex; flex-wrap: wrap; gap: .75rem; align-items: end; }
label { display: block; font-size: .92rem; color: var(--faint); }
label > input, label > select { display: block; color: var(--ink); }
input, select, button { font: inherit; color: inherit; background: transparent; border: 1px solid var(--faint); border-radius: 0; min-height: 2.75rem; padding: .3rem .7rem; max-width: 100%; }
button { border-color: var(--accent); color: var(--accent); cursor: pointer; }
button:hover { background: var(--accent); color: var(--paper); }
.status { font-weight: 700; }
.notice { border-left: 3px solid var(--accent); padding-left: .8rem; }
.events { list-style: none; margin: 1rem 0 0; padding: 0; }
.events > li { border-top: 1px solid var(--rule); padding: .8rem 0 1rem; }
code { font-family: inherit; border-bottom: 1px solid var(--rule); overflow-wrap: anywhere; }
.hidden { position: absolute; width: 1px; height: 1px; overflow: hidden; clip-path: inset(50%); white-space: nowrap; }
.cautions li { margin: .2rem 0; }
@media (min-width: 44rem) { td { white-space: nowrap; } td[colspan] { white-space: normal; } }
@media (max-width: 30rem) {
  h1 { font-size: 1.7rem; } .lead { font-size: 1.3rem; }
  .evenings > li { padding-left: 1.8rem; }
}
@page { margin: 16mm; }
@media print {
  html { background: none; font-size: 10pt; } body { max-width: none; padding: 0; }
  form, summary, .screen { display: none; } h2 { break-after: avoid; } li { break-inside: avoid; }
}
`;

/** Address of the style sheet; it changes with its content, so that browsers may keep it for good. */
export const STYLE_ADDRESS = `/style.css?${createHash('sha256').update(STYLE).digest('hex').slice(0, 12)}`;
