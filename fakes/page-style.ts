/** The plain look that the stand-ins' pages share. Every colour pair for text is at least 4.5:1. */
export const PAGE_STYLE = `
:root { --ink: #16245a; --soft: #4a5780; --desk: #e6edf4; --sheet: #fff; --rule: #b7c5d9; --field: #6e7fa3; --alarm: #b3261e; }
* { box-sizing: border-box; }
html { -webkit-text-size-adjust: 100%; }
body { margin: 0; background: var(--desk); color: var(--ink); font: 1.0625rem/1.5 system-ui, 'Segoe UI', 'Noto Sans', sans-serif;
  font-variant-numeric: tabular-nums; overflow-wrap: anywhere; }
a { color: inherit; text-underline-offset: .2em; }
h1, h2, p, dl, dd, ul, ol, figure { margin: 0; padding: 0; }
h1, h2 { line-height: 1.2; text-wrap: balance; }
:focus-visible { outline: 3px solid var(--ink); outline-offset: 2px; }
.notice { background: var(--ink); color: #fff; padding: .7rem 1.25rem; font-size: .9375rem; }
.notice strong { font-weight: 650; }
.sheet { background: var(--sheet); border: 1px solid var(--rule); }
.soft { color: var(--soft); font-size: .9375rem; }
`
