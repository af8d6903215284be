/** The sheet of the stand-ins' own pages: the house's colours and faces, plainer, so that nobody takes them for the shop. */
const DAY = `color-scheme: light; --ground: #dce1df; --sheet: #f0f3f2; --field: #f8fbf9; --ink: #111e33; --quiet: #4a545f; --link: #2b5283; --rule: #b0b8b8;
  --edge: #646f77; --beam: #172a47; --act: #172a47; --on-act: #f8fbf9; --weld: #e8ca33; --tint: #f8f2cc; --on-tint: #111e33; --mend: #9f2f27; --ring: #111e33; --ring-2: #e8ca33;`;
const EVENING = `color-scheme: dark; --ground: #0f1621; --sheet: #16202d; --field: #090f18; --ink: #e0e5e3; --quiet: #a8b3bb; --link: #97b5d3; --rule: #374454;
  --edge: #788693; --beam: #374454; --act: #e0e5e3; --on-act: #0a1321; --weld: #e8ca33; --tint: #362e10; --on-tint: #f4eed0; --mend: #ec9789; --ring: #e8ca33; --ring-2: #090f18;`;

export const LOOK = `
@font-face { font-family: "Sofia Sans"; src: url("/stand-ins/sofia-sans.woff2") format("woff2"); font-weight: 1 1000; font-display: swap; }
@font-face { font-family: "Lora"; src: url("/stand-ins/lora.woff2") format("woff2"); font-weight: 500; font-display: swap; }
:root { ${DAY} }
@media (prefers-color-scheme: dark) { :root { ${EVENING} } }
*, *::before, *::after { box-sizing: border-box; }
body { margin: 0; background: var(--ground); color: var(--ink); font: 1.0625rem/1.45 "Sofia Sans", "Segoe UI", "Helvetica Neue", Arial, sans-serif; border-top: 6px solid var(--beam); overflow-wrap: break-word; }
.page { max-width: 1080px; margin: 0 auto; padding: 0 40px 64px; }
.head { display: flex; flex-wrap: wrap; gap: 4px 24px; align-items: baseline; padding: 16px 0; border-bottom: 1px solid var(--rule); font-size: .9375rem; color: var(--quiet); }
.head strong { color: var(--ink); font-size: 1.0625rem; }
.head nav { margin-left: auto; display: flex; gap: 16px; }
h1, h2, h3 { font-family: Lora, Georgia, serif; font-weight: 500; letter-spacing: -.012em; text-wrap: balance; margin: 0; line-height: 1.18; }
h1 { font-size: clamp(1.875rem, 1.4rem + 2vw, 2.5rem); margin: 32px 0 8px; }
h2 { font-size: 1.375rem; margin: 0 0 12px; }
a { color: var(--link); text-underline-offset: .25em; text-decoration-thickness: 1px; }
p { margin: 0 0 12px; max-width: 40em; }
.quiet { color: var(--quiet); font-size: .9375rem; }
.say { background: var(--tint); color: var(--on-tint); padding: 12px 16px; margin: 16px 0 0; border-left: 4px solid var(--weld); max-width: none; }
.pair { display: grid; grid-template-columns: 340px minmax(0, 1fr); gap: 48px; margin-top: 32px; align-items: start; }
.sheet { background: var(--sheet); border: 1px solid var(--ink); padding: 24px; }
.price { font-size: 2.25rem; line-height: 1.1; font-weight: 600; margin: 0 0 4px; font-variant-numeric: lining-nums; }
.lines { list-style: none; margin: 16px 0 0; padding: 0; border-top: 1px solid var(--rule); }
.lines li { display: flex; gap: 16px; justify-content: space-between; padding: 10px 0; border-bottom: 1px solid var(--rule); }
.lines li > span:last-child { white-space: nowrap; font-variant-numeric: tabular-nums lining-nums; }
fieldset { border: 0; margin: 0 0 32px; padding: 0; min-width: 0; }
legend { font: 500 1.375rem/1.2 Lora, Georgia, serif; padding: 0; margin-bottom: 16px; }
.field { margin-bottom: 16px; max-width: 26em; }
.field label { display: block; font-weight: 600; }
.hint { display: block; font-size: .9375rem; color: var(--quiet); }
.field input, .field select { width: 100%; min-height: 46px; margin-top: 6px; padding: 8px 12px; font: inherit; color: inherit; background: var(--field); border: 1px solid var(--edge); border-bottom: 2px solid var(--ink); border-radius: 2px; font-variant-numeric: tabular-nums lining-nums; }
.bad input { border: 2px solid var(--mend); }
.wrong { display: block; color: var(--mend); font-weight: 600; font-size: .9375rem; margin-top: 6px; }
.notice { background: var(--sheet); border-top: 4px solid var(--mend); padding: 16px; margin: 24px 0 0; }
.notice h2 { color: var(--mend); margin-bottom: 4px; }
.notice p { margin: 0; }
.notice ul { margin: 0; padding-left: 20px; }
.notice a { color: inherit; }
.narrow { display: grid; grid-template-columns: 1fr 1fr; gap: 16px; max-width: 26em; }
.after { margin-top: 12px; }
.acts { display: flex; flex-wrap: wrap; gap: 12px; margin-top: 24px; }
.btn { display: inline-flex; align-items: center; justify-content: center; min-height: 44px; padding: 0 20px; border: 1.5px solid var(--ink); border-radius: 2px; background: transparent; color: var(--ink); font: inherit; font-weight: 600; text-decoration: none; cursor: pointer; transition: box-shadow 140ms; }
.btn:active { box-shadow: inset 0 3px 0 var(--ink); }
.act { background: var(--act); border-color: var(--act); color: var(--on-act); min-height: 48px; padding-bottom: 3px; box-shadow: inset 0 -4px 0 var(--weld); }
.act:hover { box-shadow: inset 0 -7px 0 var(--weld); }
.act:active { box-shadow: inset 0 4px 0 var(--weld); }
.small { min-height: 44px; padding: 0 12px; font-size: .9375rem; white-space: nowrap; }
:focus-visible { outline: 3px solid var(--ring); outline-offset: 3px; box-shadow: 0 0 0 3px var(--ring-2); }
.scroll { overflow-x: auto; }
table { width: 100%; border-collapse: collapse; text-align: left; }
caption { text-align: left; font: 500 1.375rem/1.2 Lora, Georgia, serif; margin-bottom: 12px; }
th { font-size: .9375rem; font-weight: 600; border-bottom: 2px solid var(--ink); padding: 8px 16px 8px 0; }
td { border-bottom: 1px solid var(--rule); padding: 8px 16px 8px 0; vertical-align: middle; }
td:last-child, th:last-child { padding-right: 0; }
.num { font-variant-numeric: tabular-nums lining-nums; white-space: nowrap; }
.mails { list-style: none; margin: 24px 0 0; padding: 0; border-top: 2px solid var(--ink); }
.mails li { display: grid; grid-template-columns: minmax(0, 15em) minmax(0, 1fr) auto; gap: 4px 24px; padding: 12px 0; border-bottom: 1px solid var(--rule); }
.mails a { font-weight: 600; }
dl { display: grid; grid-template-columns: max-content minmax(0, 1fr); gap: 4px 16px; margin: 16px 0 24px; }
dt { color: var(--quiet); }
dd { margin: 0; }
.text { white-space: pre-wrap; background: var(--sheet); padding: 24px; margin: 0 0 32px; max-width: none; font: inherit; }
iframe { width: 100%; height: 560px; border: 1px solid var(--edge); background: #fff; margin-bottom: 32px; }
details { margin: 16px 0 32px; }
details caption { position: absolute; width: 1px; height: 1px; overflow: hidden; clip-path: inset(50%); }
summary { cursor: pointer; padding: 10px 0; font-weight: 600; }
.room { margin-top: 32px; }
@media (max-width: 899px) {
  .page { padding: 0 16px 48px; }
  .pair { grid-template-columns: minmax(0, 1fr); gap: 32px; }
  .mails li { grid-template-columns: minmax(0, 1fr); }
  .head nav { margin-left: 0; }
}
@media (max-width: 519px) { .acts .btn { width: 100%; } dl { grid-template-columns: minmax(0, 1fr); } dd { margin-bottom: 8px; } }
@media (forced-colors: active) { .btn, .field input, .field select { border-color: CanvasText; } :focus-visible { outline-color: Highlight; } }
`;
