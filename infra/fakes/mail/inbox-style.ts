/** The inbox's one style sheet: the product's colors in light and dark, nothing loaded from elsewhere. */
export const inboxStyle = `
:root { color-scheme: light dark; --page: #eef1f4; --surface: #fff; --line: #d8dee6; --ink: #141b26;
  --quiet: #56606f; --action: #1d3f8f; --note: #fbebd3; --note-ink: #5f3608; }
@media (prefers-color-scheme: dark) { :root { --page: #12161d; --surface: #1a2029; --line: #333d4a;
  --ink: #e6eaf0; --quiet: #a5b0bf; --action: #a9c1ff; --note: #3d2a10; --note-ink: #ffdca8; } }
* { box-sizing: border-box; }
body { margin: 0; background: var(--page); color: var(--ink); font: 15px/1.5 system-ui, sans-serif; }
main { max-width: 980px; margin: 0 auto; padding: 24px 16px 64px; }
h1 { font-size: 24px; line-height: 1.25; margin: 16px 0 8px; overflow-wrap: anywhere; }
h2 { font-size: 16px; margin: 24px 0 8px; }
a { color: var(--action); }
a:focus-visible, button:focus-visible, input:focus-visible { outline: 3px solid var(--action); outline-offset: 2px; }
.note { background: var(--note); color: var(--note-ink); padding: 8px 12px; border-radius: 8px; margin: 0; }
.quiet { color: var(--quiet); }
.panel { background: var(--surface); border: 1px solid var(--line); border-radius: 10px; overflow: hidden; }
.padded { padding: 16px; }
.bar { display: flex; flex-wrap: wrap; gap: 8px 16px; align-items: center; margin: 16px 0; }
.mails { list-style: none; margin: 0; padding: 0; }
.mails li + li { border-top: 1px solid var(--line); }
.mails a { display: block; padding: 12px 16px; text-decoration: none; color: inherit; }
.mails a:hover { background: var(--page); }
.mails strong { display: block; overflow-wrap: anywhere; }
dl { display: grid; grid-template-columns: max-content 1fr; gap: 4px 16px; margin: 0; }
dt { color: var(--quiet); }
dd { margin: 0; overflow-wrap: anywhere; }
pre { white-space: pre-wrap; overflow-wrap: anywhere; margin: 0; font: inherit; }
iframe { display: block; width: 100%; height: 70vh; border: 0; background: #fff; }
input, button { font: inherit; color: inherit; background: var(--surface); border: 1px solid var(--quiet);
  border-radius: 8px; padding: 6px 12px; min-height: 40px; }
button { cursor: pointer; }
`;
