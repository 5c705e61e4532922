/** The one stylesheet of the hosted pages. */
export const STYLE = `
:root { color-scheme: light; font-family: system-ui, sans-serif; font-size: 100%; }
body { margin: 0; background: #f4f4f1; color: #1d1d1b; line-height: 1.5; }
.notice { margin: 0; padding: 0.75rem 1rem; background: #5b2a00; color: #fff; text-align: center; font-weight: 600; }
main { box-sizing: border-box; max-width: 38rem; margin: 1.5rem auto; padding: 1.5rem; background: #fff; border: 1px solid #d5d5cf; }
h1 { margin: 0 0 1rem; font-size: 1.5rem; }
h2 { margin: 1.5rem 0 0.5rem; font-size: 1.15rem; }
table { width: 100%; border-collapse: collapse; }
th, td { padding: 0.4rem 0.25rem; text-align: left; border-bottom: 1px solid #e4e4de; vertical-align: top; }
td.number, th.number { text-align: right; font-variant-numeric: tabular-nums; white-space: nowrap; }
fieldset { margin: 1rem 0; padding: 0.75rem 1rem; border: 1px solid #b9b9b2; }
legend { padding: 0 0.35rem; font-weight: 600; }
label { display: block; margin: 0.4rem 0; }
label.field { font-weight: 600; }
input[type='email'], input[type='text'] { display: block; box-sizing: border-box; width: 100%; margin-top: 0.25rem; padding: 0.6rem; font: inherit; border: 1px solid #77776f; }
input[type='radio'] { width: 1.15rem; height: 1.15rem; vertical-align: -0.2rem; }
button { display: block; width: 100%; margin: 0.75rem 0; padding: 0.75rem 1rem; font: inherit; font-weight: 600; color: #fff; background: #14532d; border: 0; cursor: pointer; }
button.quiet { color: #1d1d1b; background: #e4e4de; }
a { color: #14532d; }
:focus-visible { outline: 3px solid #b45309; outline-offset: 2px; }
.alert { padding: 0.75rem 1rem; border: 2px solid #b91c1c; color: #7f1d1d; background: #fef2f2; }
.test { border-style: dashed; }
@media (max-width: 30rem) { main { padding: 1rem; } table { font-size: 0.9rem; } }
.total { font-size: 1.6rem; font-weight: 700; }
`;
