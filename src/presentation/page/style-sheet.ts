import { WIDEST } from './cell.js';

const range = Array.from({ length: WIDEST + 1 }, (_, at) => at);
/** Boxes for decimals and unit: as wide as their column needs. */
const BOXES = range.map((n) => `.f${n} .f{min-width:${n}ch}.u${n} .u{min-width:${n}ch}`).join('\n');

/** Colours hold 4.5:1 for text and 3:1 for lines on their ground, light and dark (WCAG 2.2, 1.4.3 and 1.4.11); pass and fail are blue and vermillion, never green and red. */
const COLOURS = `:root{color-scheme:light dark;
--paper:#fff;--ink:#1a1a1a;--soft:#595959;--line:#8a8a8a;--rule:#d9d9d9;--band:#f4f4f2;--good:#0072b2;--bad:#b84a00;--open:#595959;--link:#005a9c;
--grid:#d9d9d9;--faint:#6b6b6b;--pass:#0072b2;--fail:#b84a00;--series-1:#0072b2;--series-2:#b84a00;--series-3:#007a59;--series-4:#a8527f}
@media (prefers-color-scheme:dark){:root{
--paper:#121212;--ink:#ececec;--soft:#b4b4b4;--line:#8a8a8a;--rule:#3a3a3a;--band:#1e1e1e;--good:#56b4e9;--bad:#ff9a5c;--open:#c0c0c0;--link:#8cc8ff;
--grid:#3a3a3a;--faint:#a8a8a8;--pass:#56b4e9;--fail:#ff9a5c;--series-1:#56b4e9;--series-2:#ff9a5c;--series-3:#3fc69b;--series-4:#dc93bb}}`;

const LAYOUT = `*{box-sizing:border-box}
html{font:100%/1.5 system-ui,"Segoe UI","DejaVu Sans",sans-serif;background:var(--paper);color:var(--ink);-webkit-text-size-adjust:100%}
body{margin:0;overflow-wrap:break-word}
header,main,footer{max-width:84rem;margin:0 auto;padding:0 1.25rem}
header{padding-top:1.5rem}footer{padding-bottom:3rem;color:var(--soft)}
h1{font-size:1.75rem;line-height:1.2;margin:.2rem 0 .4rem}
h2{font-size:1.4rem;line-height:1.25;margin:2.5rem 0 .6rem;padding-top:.6rem;border-top:3px solid var(--ink)}
h3{font-size:1.12rem;line-height:1.3;margin:1.9rem 0 .5rem}
h4{font-size:1rem;margin:1.2rem 0 .3rem}
p,ul,ol{margin:.4rem 0;max-width:48rem}li{margin:.15rem 0}
a{color:var(--link)}
:focus-visible{outline:3px solid var(--link);outline-offset:2px}
.skip{position:absolute;left:-999rem}.skip:focus{position:static;display:inline-block;padding:.5rem}
.made,.soft,.csv{color:var(--soft);font-size:.875rem}
nav ol{list-style:none;padding:0;display:flex;flex-wrap:wrap;gap:.1rem 1.1rem;max-width:none}
nav .whole{flex-basis:100%}nav ol ol{font-size:.9rem;padding-left:1rem}
nav a,.csv a{display:inline-block;max-width:100%;overflow-wrap:anywhere}
nav a,.csv a,summary{min-height:24px;min-width:24px;line-height:24px}summary{cursor:pointer;width:fit-content;margin:.3rem 0}
code,pre{font-family:ui-monospace,"DejaVu Sans Mono",monospace;font-size:.85rem}
pre{background:var(--band);border:1px solid var(--rule);padding:.7rem .9rem;overflow-x:auto;max-width:100%}
pre.wrap{white-space:pre-wrap;overflow-wrap:anywhere}
bdi{overflow-wrap:anywhere}
.answer{border:2px solid var(--line);border-left-width:.6rem;padding:.3rem 1.1rem .8rem;margin:.8rem 0;max-width:60rem}
.answer.good{border-color:var(--good)}.answer.bad{border-color:var(--bad);border-left-style:double}.answer.open{border-color:var(--open);border-style:dashed}
.verdict{font-size:1.3rem;font-weight:700;margin:.4rem 0;line-height:1.3}
.good .w{color:var(--good);font-weight:600}.bad .w{color:var(--bad);font-weight:600}.open .w{color:var(--open);font-weight:600}
.caution{border-left:.25rem solid var(--bad);padding-left:.6rem}
.w{white-space:nowrap}.verdict .w{white-space:normal}`;

const TABLES = `.scroll{overflow-x:auto;max-width:100%;margin:.7rem 0 0}
table{border-collapse:collapse;font-size:.9rem;line-height:1.4}
caption{text-align:left;font-weight:600;padding:.2rem 0 .35rem}
th,td{text-align:left;vertical-align:top;padding:.28rem .8rem .28rem 0;border-bottom:1px solid var(--rule);overflow-wrap:normal}
thead th{border-bottom:2px solid var(--line);vertical-align:bottom}
tbody th{font-weight:600}
tbody td,tbody th{white-space:nowrap}tbody .s{min-width:16rem;white-space:normal}
td bdi,th bdi{display:inline-block;max-width:22rem;white-space:normal;overflow-wrap:break-word}td bdi.k,th bdi.k{white-space:nowrap}.s bdi{display:inline}.also{display:block;font-weight:400;color:var(--soft)}
thead .n{white-space:normal}
.n{text-align:right;white-space:nowrap;font-variant-numeric:tabular-nums}
.f,.u{display:inline-block;text-align:left}.f{font-variant-numeric:tabular-nums}
${BOXES}
thead button{font:inherit;font-weight:600;color:inherit;background:none;border:0;padding:0;min-height:24px;min-width:24px;text-align:inherit;cursor:pointer;text-decoration:underline dotted;text-underline-offset:.2em}
th[aria-sort=ascending] button::after{content:" ▲"}th[aria-sort=descending] button::after{content:" ▼"}
tr:target,section:target>h2,section:target>h3{outline:3px solid var(--link)}
dl{display:grid;grid-template-columns:minmax(8rem,max-content) minmax(0,1fr);gap:.2rem 1.2rem;margin:.6rem 0;max-width:60rem}
dt{color:var(--soft)}dd{margin:0}
figure{margin:1.6rem 0}figure svg{display:block;width:100%;height:auto}.drawn{width:calc(var(--w) / 16 * 1rem)}figcaption{max-width:48rem}
figcaption{margin:.2rem 0}figcaption b{display:block}
.sign{display:grid;grid-template-columns:repeat(auto-fit,minmax(min(14rem,100%),1fr));gap:2.4rem 2rem;padding:1.6rem 0 0;list-style:none;max-width:none}
.sign li{border-top:1px solid var(--line);padding-top:.2rem}
.out{position:absolute;width:1px;height:1px;overflow:hidden;clip-path:inset(50%)}
@media (max-width:34rem){dl{grid-template-columns:minmax(0,1fr)}dd{margin-bottom:.5rem}header,main,footer{padding-left:.8rem;padding-right:.8rem}}
@media (forced-colors:active){.answer{border-color:CanvasText}thead button{text-decoration:underline}}`;

const PRINT = `@media print{
:root{color-scheme:light;--paper:#fff;--ink:#000;--soft:#333;--line:#555;--rule:#bbb;--band:#fff;--good:#000;--bad:#000;--open:#000;--link:#000;
--grid:#d0d0d0;--faint:#444;--pass:#0072b2;--fail:#b84a00;--series-1:#0072b2;--series-2:#b84a00;--series-3:#007a59;--series-4:#a8527f}
html{font-size:9.5pt}header,main,footer{max-width:none;padding:0}
.skip,.csv,nav{display:none}
h2,h3,h4,caption,figcaption{break-after:avoid}tr,li,dt,dd,.verdict,figcaption,figure>.scroll,#sign-off,.sign li{break-inside:avoid}figcaption,.verdict{break-after:avoid}.answer{-webkit-box-decoration-break:clone;box-decoration-break:clone}
figure .drawn{width:calc(var(--w) * 1px);max-width:100%}thead{display:table-header-group;break-inside:avoid}.scroll{overflow:visible}
table{width:100%;font-size:7.5pt}tbody .s{min-width:9em}th,td{padding:.15rem .35rem .15rem 0}tbody td,tbody th{white-space:normal}td bdi,th bdi,td bdi.k,th bdi.k{max-width:none;white-space:normal}td bdi:not(.k),th bdi:not(.k){overflow-wrap:anywhere}tbody .n,.w{white-space:nowrap}
.f,.u{min-width:0!important}
thead button{display:contents}
details::details-content{content-visibility:visible!important;display:block}details>summary{list-style:none}
pre{white-space:pre-wrap;overflow-wrap:anywhere;font-size:7.5pt}
a[href^=http]::after{content:" (" attr(href) ")"}}`;

/** Everything a page looks like. `mark` stands in the margin of every printed page. */
export function styleSheet(mark: string): string {
  const margins = `@page{margin:16mm 13mm 17mm;@bottom-left{content:"${cssText(mark)}";font:7.5pt sans-serif}@bottom-right{content:counter(page) " / " counter(pages);font:7.5pt sans-serif}}`;
  return [COLOURS, LAYOUT, TABLES, PRINT, margins].join('\n');
}

/** Inside a CSS string in an HTML style element nothing but plain characters; the rest as code points (CSS Syntax Level 3, 4.3.7). */
function cssText(text: string): string {
  return text.replace(/[^A-Za-z0-9 ._·-]/gu, (sign) => `\\${(sign.codePointAt(0) ?? 0).toString(16)} `);
}
