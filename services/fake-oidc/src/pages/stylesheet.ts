/** The look of the local stand-ins: the registry's paper and ink, set in whatever the reader's system has. */
export const stylesheetPath = '/stand-in.css';

export const stylesheet = `
:root {
  color-scheme: light dark;
  --paper: #f5f2ea; --sheet: #fcfbf7; --ink: #23272b; --quiet: #59626a; --hairline: #d9d3c4;
  --lichen: #4d6b3f; --on-lichen: #fcfbf7; --lake: #255e70; --amber: #8a5a00;
}
@media (prefers-color-scheme: dark) {
  :root {
    --paper: #171a1c; --sheet: #1f2326; --ink: #ece8dd; --quiet: #a9b0b3; --hairline: #363c40;
    --lichen: #9dbb86; --on-lichen: #171a1c; --lake: #7fb8c9; --amber: #e0ae54;
  }
}
* { box-sizing: border-box; }
body { margin: 0; background: var(--paper); color: var(--ink); font: 16px/1.5 "Public Sans", system-ui, sans-serif; overflow-wrap: anywhere; }
.notice { margin: 0; padding: 12px 16px; border-bottom: 2px solid var(--amber); background: var(--sheet); }
.notice strong { color: var(--amber); }
main { max-width: 44rem; margin: 0 auto; padding: 24px 16px 48px; }
h1 { font-size: 24px; line-height: 1.25; font-weight: 600; margin: 0 0 12px; }
h2 { font-size: 18px; line-height: 1.35; font-weight: 600; margin: 32px 0 8px; }
p { margin: 0 0 16px; }
a { color: var(--lake); }
.quiet { color: var(--quiet); }
.sheet { list-style: none; margin: 0 0 24px; padding: 0; background: var(--sheet); border: 1px solid var(--hairline); border-radius: 2px; }
.sheet > li + li { border-top: 1px solid var(--hairline); }
.sheet > li > p, .sheet > li > a { display: block; margin: 0; padding: 12px 16px; }
.choice { display: block; width: 100%; padding: 12px 16px; border: 0; background: none; color: inherit; font: inherit; text-align: left; cursor: pointer; }
.choice strong, .choice span { display: block; }
.choice:hover strong { text-decoration: underline; }
button.act { padding: 8px 16px; border: 1px solid var(--lichen); border-radius: 2px; background: var(--lichen); color: var(--on-lichen); font: inherit; font-weight: 600; cursor: pointer; }
button.plain { padding: 8px 16px; border: 1px solid var(--quiet); border-radius: 2px; background: none; color: inherit; font: inherit; cursor: pointer; }
.row { display: flex; flex-wrap: wrap; gap: 12px; align-items: center; }
:focus-visible { outline: 3px solid var(--lake); outline-offset: 2px; }
.choice:focus-visible { outline-offset: -3px; }
dl { margin: 0 0 24px; }
dt { color: var(--quiet); }
dd { margin: 0 0 8px; }
pre { margin: 0 0 24px; padding: 16px; background: var(--sheet); border: 1px solid var(--hairline); border-radius: 2px; font: 15px/1.5 ui-monospace, monospace; white-space: pre-wrap; }
`;
