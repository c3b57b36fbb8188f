/** The page's only style sheet; system fonts, no files from elsewhere. */
export const STYLES = `
:root { color-scheme: light dark; --ground: #fbfaf8; --panel: #fff; --text: #22201c; --quiet: #625d54; --line: #d8d3c9; --link: #7a4a12; --warn: #9c2a1c; }
@media (prefers-color-scheme: dark) {
  :root { --ground: #181613; --panel: #211f1b; --text: #ece8e0; --quiet: #b0a99c; --line: #454037; --link: #e3b27a; --warn: #ff9c8a; }
}
* { box-sizing: border-box; }
body { margin: 0; background: var(--ground); color: var(--text); font: 1rem/1.5 system-ui, sans-serif; }
header { display: flex; flex-wrap: wrap; gap: 0 1rem; align-items: baseline; padding: .75rem 1rem; border-bottom: 1px solid var(--line); }
header a { font-weight: 600; color: inherit; text-decoration: none; }
header span, .count, .empty { color: var(--quiet); }
main { max-width: 72rem; margin: 0 auto; padding: 1rem; }
h1 { font-size: 1.5rem; line-height: 1.25; margin: .5rem 0 1rem; overflow-wrap: anywhere; }
h2 { font-size: 1.1rem; margin: 2rem 0 .5rem; }
a { color: var(--link); }
:focus-visible { outline: 2px solid var(--link); outline-offset: 2px; }
#failure { color: var(--warn); font-weight: 600; }
.tools { display: flex; flex-wrap: wrap; gap: .75rem; justify-content: space-between; align-items: end; }
form { display: flex; flex-wrap: wrap; gap: .5rem .75rem; align-items: end; }
form[role='search'] { align-items: center; }
label { display: grid; gap: .15rem; color: var(--quiet); }
input, select, button { font: inherit; color: var(--text); background: var(--panel); border: 1px solid var(--quiet); border-radius: 4px; padding: .4rem .7rem; min-height: 2.75rem; max-width: 100%; }
button { cursor: pointer; }
button:disabled { color: var(--quiet); cursor: default; }
#behaviour p { margin: 0; padding: .6rem 0; }
table { width: 100%; border-collapse: collapse; background: var(--panel); }
th, td { text-align: left; vertical-align: top; padding: .5rem .6rem; border-bottom: 1px solid var(--line); overflow-wrap: anywhere; }
th { color: var(--quiet); font-weight: 600; }
.figure { text-align: right; white-space: nowrap; font-variant-numeric: tabular-nums; }
.when { font-variant-numeric: tabular-nums; white-space: nowrap; }
.subject { width: 34%; }
.messages td:last-child { width: 22%; }
.paging { display: flex; gap: 1rem; margin: .75rem 0; }
.paging a { padding: .3rem 0; }
dl { display: grid; grid-template-columns: max-content minmax(0, 1fr); gap: .25rem 1rem; margin: 0 0 1rem; }
dt { color: var(--quiet); }
dd { margin: 0; overflow-wrap: anywhere; white-space: pre-line; }
pre { margin: 0; padding: .75rem; background: var(--panel); border: 1px solid var(--line); overflow-x: auto; white-space: pre-wrap; overflow-wrap: anywhere; }
iframe { display: block; width: 100%; height: 26rem; max-height: 70vh; resize: vertical; background: #fff; border: 1px solid var(--line); color-scheme: light; }
details { margin-top: 2rem; }
summary { font-size: 1.1rem; font-weight: 600; cursor: pointer; padding: .3rem 0; }
@media (max-width: 40rem) {
  .messages thead { position: absolute; clip-path: inset(50%); width: 1px; height: 1px; overflow: hidden; }
  .messages tr { display: grid; padding: .6rem; border-bottom: 1px solid var(--line); }
  .messages td, .messages td:last-child { border: 0; padding: 0; width: auto; }
  .messages td[data-label]::before { content: attr(data-label) ' '; color: var(--quiet); }
  .messages .subject { order: -1; font-weight: 600; }
  .messages .subject a { display: inline-block; padding: .3rem 0; }
  dl { grid-template-columns: minmax(0, 1fr); gap: 0; }
  dd { margin-bottom: .5rem; }
}
`;
