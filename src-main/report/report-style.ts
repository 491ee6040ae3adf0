import type { Report } from '../contract/project.ts';
import { printPalette as colour } from '../figures/palette.ts';
import { shortDigest } from '../quantities/notation.ts';

const sans = "'Atkinson Hyperlegible Next', Verdana, sans-serif";
const serif = 'Literata, Georgia, serif';
const mono = "'Atkinson Hyperlegible Mono', monospace";

/** Paper, margins and what runs along every page: what it is, which page of how many, and the trail head. */
export function pageRules({ title, isInvented, head }: Report): string {
  const foot = `font: 400 8pt/1.3 ${sans}; color: ${colour.ink2}; vertical-align: top; padding-top: 3mm; border-top: 0.5pt solid ${colour.rule};`;
  const top = `font: 600 8pt/1.3 ${sans}; color: ${colour.stated}; vertical-align: bottom; padding-bottom: 4mm;`;
  return `
@page {
  size: A4;
  margin: 18mm 20mm 19mm;
  @bottom-left { content: ${cssString(title)} " · page " counter(page) " of " counter(pages); ${foot} }
  @bottom-right { content: ${cssString(`Trail ${head.sequence} · ${shortDigest(head.hash)}`)}; text-align: right; ${foot} }
  ${isInvented ? `@top-right { content: "Invented data"; ${top} text-align: right; }` : ''}
}
@page of-draft {
  @top-left { content: "Draft, not signed"; ${top} }
}`;
}

/** A string of CSS in which no character but letters, digits and blanks stands for itself. */
function cssString(text: string): string {
  return `"${text.replace(/[^\p{L}\p{N} ]/gu, (character) => `\\${(character.codePointAt(0) ?? 0xfffd).toString(16)} `)}"`;
}

export const reportStyle = `
* { box-sizing: border-box; margin: 0; padding: 0 }
html { background: #e9e7e0 }
body { color-scheme: light; font: 400 13px/1.5 ${sans}; color: ${colour.ink}; font-variant-numeric: tabular-nums }
main { width: 794px; max-width: 100%; margin: 24px auto }
.page { background: #fff; padding: 64px 76px 56px; margin-bottom: 20px }
h1, h2, h3, .say, .prose { font-family: ${serif} }
h1 { font-size: 25px; font-weight: 500; line-height: 1.22; letter-spacing: -0.004em; margin: 5px 0 14px; text-wrap: balance; overflow-wrap: anywhere }
h2 { font-size: 17px; font-weight: 600; line-height: 1.3; margin: 28px 0 6px }
h3 { font-size: 14px; font-weight: 600; line-height: 1.35; margin: 18px 0 4px; overflow-wrap: anywhere }
.page > h2:first-of-type { margin-top: 12px }
.first h2, .first > h2:first-of-type { margin-top: 14px; margin-bottom: 3px }
.first dl { font-size: 12.5px; grid-template-columns: 80px 1fr; margin-bottom: 10px }
.first td:last-child { white-space: nowrap }
.first table { margin: 2px 0 10px }
.first figure { margin: 8px 0 10px }
.kicker, .quiet, .digests { color: ${colour.ink2} }
.quiet { font-size: 12px; line-height: 1.42 }
p { margin-bottom: 8px; max-width: 68ch; overflow-wrap: anywhere }
.say { font-size: 15px; line-height: 1.48; max-width: none; margin-bottom: 9px }
.prose { font-size: 14px }
.lead { font-size: 14.5px }
.draft, .bad { color: ${colour.stated}; font-weight: 650 }
.invented { color: ${colour.stated}; font-weight: 650; background: #fff; border-left: 3px solid ${colour.stated}; padding: 10px 14px; max-width: none; margin-bottom: 20px }
.empty { color: ${colour.ink2} }
dl { display: grid; grid-template-columns: 118px 1fr; gap: 3px 14px; margin: 4px 0 12px }
dt { color: ${colour.ink2} }
dd { min-width: 0; overflow-wrap: anywhere }
ul { padding-left: 16px; margin-bottom: 8px }
li { margin-bottom: 2px; overflow-wrap: anywhere }
.caveats { list-style: "– " inside; padding-left: 0; color: ${colour.ink2}; font-size: 12px; margin: 3px 0 8px }
.cautions { padding-left: 12px; border-left: 2px solid ${colour.rule}; color: ${colour.ink2}; font-size: 11px; line-height: 1.42; max-width: none }
.note { border-left: 2px solid ${colour.rule}; padding-left: 12px; margin: 8px 0 12px }
figure { margin: 12px 0 14px }
figure svg { display: block; width: 100%; height: auto }
figcaption { color: ${colour.ink2}; font-size: 12px; margin-top: 5px }
code { font: 400 0.92em ${mono} }
.digest { font-size: 10px; line-height: 1.4; color: ${colour.ink2} }
.digest span:not(:last-child) { margin-right: 0.6ch }
.key { font-size: 11.5px; word-spacing: -0.25ch }
table { border-collapse: collapse; width: 100%; margin: 8px 0 14px; font-size: 12.5px; line-height: 1.42 }
caption { text-align: left; color: ${colour.ink2}; font-size: 12px; padding-bottom: 3px }
th, td { text-align: left; vertical-align: baseline; font-weight: 400; padding: 5px 12px 5px 0; border-top: 1px solid ${colour.rule2}; overflow-wrap: break-word }
th:last-child, td:last-child { padding-right: 0 }
thead th { color: ${colour.ink2}; font-size: 12px; border-top: 0; border-bottom: 1px solid ${colour.rule}; overflow-wrap: normal }
tbody tr:first-child > * { border-top: 0 }
.n { text-align: right; white-space: nowrap }
td .quiet { white-space: normal }
.range { white-space: nowrap !important }
.small { font-size: 11.5px }
.small, .quantiles { width: auto; min-width: 55% }
.small th, .small td, .quantiles th, .quantiles td { padding-right: 24px }
.halves th[scope='row'] { width: 58% }
.pair { display: grid; grid-template-columns: 1fr 1fr; gap: 0 20px }
.ledger th[scope='row'] { width: 42% }
.ledger td:last-child { white-space: nowrap }
.published th[scope='row'] { width: 24% }
.published td:nth-child(3) { width: 30% }
.contents td:nth-child(2) { width: 46% }
.sources td:last-child { width: 34% }
a { color: ${colour.accent} }
sub, sup { font-size: 0.72em; line-height: 0 }
@media print {
  html { background: none }
  main { width: auto; margin: 0 }
  .page { padding: 0; margin: 0; break-before: page }
  main > .page:first-child, .invented + .page, main > .claim:first-child > .first, .invented + .claim > .first { break-before: auto }
  .of-draft { page: of-draft }
  .invented { padding: 0 0 0 10px; margin-bottom: 12px }
  h1, h2, h3, caption, thead { break-after: avoid }
  tr, figure, li, .note, .together > dl, .first .together { break-inside: avoid }
  p { orphans: 3; widows: 3 }
  thead { display: table-header-group }
  a { color: inherit; text-decoration: none }
}
`;
