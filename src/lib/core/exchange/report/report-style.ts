/** The whole look of the report. No size of paper: A4 and Letter both follow the printer. */
export const reportStyle = `
:root { color-scheme: light; }
* { box-sizing: border-box; }
body { margin: 0; }
.report {
  margin: 0 auto; padding: 2.5rem 1.5rem; max-width: 52rem;
  background: #fff; color: #1a2129;
  font: 400 0.94rem/1.45 'Segoe UI', 'Noto Sans', Roboto, 'Helvetica Neue', Arial, sans-serif;
  font-variant-numeric: tabular-nums;
}
h1, h2, h3, p, ul, dl, table, figure { margin: 0; }
header { padding-bottom: 1rem; border-bottom: 5px solid #0a5c63; }
h1 { font-size: 1.9rem; line-height: 1.15; letter-spacing: -0.015em; }
header p { margin-top: 0.4rem; color: #4a545d; }
.mark { display: inline-block; margin-top: 0.6rem; padding: 0.1rem 0.6rem; border: 1.5px solid #4a3f8f; border-radius: 0.3rem; color: #4a3f8f; font-weight: 650; }
.main > * { margin-top: 0.9rem; }
h2 { margin-top: 2.2rem; padding-top: 0.6rem; border-top: 1px solid #c9c5b8; font-size: 1.35rem; line-height: 1.25; break-after: avoid; }
h3 { margin-top: 1.5rem; font-size: 1.05rem; break-after: avoid; }
p { max-width: 46rem; }
.answer { margin-top: 1.4rem; padding-left: 0.9rem; border-left: 6px solid #0a5c63; font-size: 1.55rem; line-height: 1.2; letter-spacing: -0.01em; font-weight: 620; }
.lead { font-size: 1.08rem; }
.soft { color: #4a545d; font-size: 0.86rem; }
.caution { padding: 0.5rem 0.8rem; border-left: 5px solid #8a4b00; background: #fbecd2; }
li + li { margin-top: 0.25rem; }
dl { display: grid; grid-template-columns: minmax(9rem, max-content) 1fr; gap: 0.2rem 1.2rem; }
dt { color: #4a545d; }
dd { margin: 0; overflow-wrap: anywhere; }
table { width: 100%; border-collapse: collapse; font-size: 0.86rem; line-height: 1.3; }
caption { padding-bottom: 0.3rem; text-align: left; font-weight: 650; font-size: 0.94rem; }
th, td { padding: 0.22rem 0.6rem 0.22rem 0; border-bottom: 1px solid #ddd9cd; text-align: left; vertical-align: top; font-weight: 400; overflow-wrap: break-word; }
thead th { border-bottom: 1.5px solid #767b7b; font-weight: 650; vertical-align: bottom; }
.n { text-align: right; white-space: nowrap; }
thead .n { white-space: normal; }
.struck { color: #a3271c; text-decoration: line-through; }
figure { break-inside: avoid; }
figure svg { display: block; width: 100%; height: auto; }
figcaption { margin-top: 0.3rem; color: #4a545d; font-size: 0.86rem; }
footer { margin-top: 2.5rem; padding-top: 0.6rem; border-top: 1px solid #c9c5b8; color: #4a545d; font-size: 0.82rem; }
@media print {
  @page { margin: 16mm 15mm 18mm; }
  .report { max-width: none; padding: 0; font-size: 9.6pt; }
  .page { break-before: page; margin-top: 0; border-top: 0; padding-top: 0; }
  thead { display: table-header-group; }
  tr, dt, dd, li { break-inside: avoid; }
  p { orphans: 3; widows: 3; }
  caption { break-after: avoid; }
  figure svg { max-height: 92mm; }
  table:not(:has(tbody tr:nth-child(19))) { break-inside: avoid; }
  .caution, .answer { print-color-adjust: exact; -webkit-print-color-adjust: exact; }
}
`;
