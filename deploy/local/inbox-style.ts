/** The viewer's stylesheet, in the product's colours. */
export const inboxStyle = `
:root {
  color-scheme: light dark;
  --surface: #f5f4ef; --card: #ffffff; --ink: #1a2327; --ink-2: #53616a; --line: #deded7;
  --kelp: #1e6a57; --on-kelp: #ffffff;
}
@media (prefers-color-scheme: dark) {
  :root {
    --surface: #10171a; --card: #182125; --ink: #e9edea; --ink-2: #9faeb4; --line: #2b383e;
    --kelp: #62bfa0; --on-kelp: #10171a;
  }
}
* { box-sizing: border-box; }
body {
  margin: 0; background: var(--surface); color: var(--ink);
  font: 400 16px/1.5 'Source Sans 3', system-ui, sans-serif; overflow-wrap: anywhere;
}
header { padding: 12px 22px; background: var(--card); border-bottom: 1px solid var(--line); }
header a { font-weight: 700; color: var(--ink); text-decoration: none; }
header p { margin: 0; color: var(--ink-2); font-size: 14px; }
main { max-width: 64rem; margin: 0 auto; padding: 22px; }
h1 { margin: 0 0 12px; font-size: 27px; line-height: 1.2; }
h2 { margin: 22px 0 8px; font-size: 18px; }
a { color: var(--kelp); }
a:focus-visible, button:focus-visible, input:focus-visible, summary:focus-visible { outline: 3px solid var(--kelp); outline-offset: 2px; }
form { display: flex; flex-wrap: wrap; gap: 8px; align-items: center; margin-bottom: 16px; }
input, button { min-height: 44px; padding: 4px 12px; border-radius: 10px; font: inherit; }
input { flex: 1 1 16rem; background: var(--card); color: inherit; border: 1px solid var(--ink-2); }
button { background: var(--kelp); color: var(--on-kelp); border: 0; font-weight: 600; }
table { width: 100%; border-collapse: collapse; background: var(--card); border-radius: 10px; }
caption { text-align: start; color: var(--ink-2); padding-bottom: 8px; }
th, td { padding: 10px 12px; text-align: start; vertical-align: top; border-top: 1px solid var(--line); }
thead th { border-top: 0; font-size: 14px; color: var(--ink-2); }
time { font-variant-numeric: tabular-nums; }
dl { display: grid; grid-template-columns: max-content 1fr; gap: 4px 16px; margin: 0; }
dt { color: var(--ink-2); }
dd { margin: 0; }
iframe { width: 100%; height: 70vh; border: 1px solid var(--line); border-radius: 10px; background: #ffffff; }
pre {
  margin: 0; padding: 16px; background: var(--card); border: 1px solid var(--line);
  border-radius: 10px; white-space: pre-wrap; font: 15px/1.5 ui-monospace, monospace;
}
details { margin: 22px 0; }
summary { cursor: pointer; font-weight: 600; padding: 8px 0; }
@media (max-width: 40rem) {
  main { padding: 16px; }
  thead { position: absolute; clip-path: inset(50%); height: 1px; width: 1px; overflow: hidden; }
  td { display: block; border: 0; padding: 2px 12px; }
  td:first-child { border-top: 1px solid var(--line); padding-top: 12px; font-weight: 600; }
  td:last-child { padding-bottom: 12px; color: var(--ink-2); }
  dl { grid-template-columns: 1fr; gap: 0; }
  dd { margin-bottom: 8px; }
}
`;
