/** Style of the report: ink on paper, dark at night, A4 in print. Verdicts differ in shape and lightness beside colour. */
export const STYLE = `
:root{--paper:#f8f5ed;--sheet:#fffdf7;--ink:#1f2329;--soft:#59554c;--rule:#cfc8b8;--link:#1c4f86;--warn:#8a2d12;--warnpaper:#fbeade;
--kept:#173b66;--borderline:#a85b00;--dropped:#8d8779;--unjudged:#7a5c99}
@media (prefers-color-scheme:dark){:root{--paper:#16181b;--sheet:#1d2024;--ink:#e9e4d8;--soft:#aaa497;--rule:#3d4046;--link:#93bdec;--warn:#ffb59a;--warnpaper:#3a2018;
--kept:#a9cbf5;--borderline:#f0a94a;--dropped:#77736a;--unjudged:#b396d6}}
*{box-sizing:border-box}
html{color-scheme:light dark}
body{margin:0;background:var(--paper);color:var(--ink);font:1rem/1.55 "Iowan Old Style","Palatino Linotype",Palatino,"Book Antiqua",Georgia,"DejaVu Serif",serif}
main,header,footer{max-width:62rem;margin:0 auto;padding:0 1.25rem}
header{padding-top:2.5rem}
footer{padding-bottom:3rem;color:var(--soft)}
h1{font-size:1.9rem;line-height:1.2;margin:0 0 .4rem;font-weight:600}
h2{font-size:1.3rem;margin:2.6rem 0 .6rem;padding-top:.5rem;border-top:1px solid var(--rule);font-weight:600}
h3{font-size:1.08rem;margin:1.6rem 0 .3rem;font-weight:600}
p,ul,dl{margin:.5rem 0;max-width:44rem}
ul{padding-left:1.2rem}
a{color:var(--link)}
.byline,figcaption,.note,caption{color:var(--soft)}
.byline{margin:0 0 1rem}
.invented{border:2px solid var(--warn);background:var(--warnpaper);color:var(--warn);padding:.6rem .9rem;font-weight:600;max-width:none}
.caution{border-left:3px solid var(--borderline);padding-left:.7rem}
nav ul{display:flex;flex-wrap:wrap;gap:.2rem 1rem;list-style:none;padding:0;max-width:none}
.counts{display:flex;flex-wrap:wrap;gap:.8rem 2rem;max-width:none;margin:1rem 0}
.counts div{display:flex;flex-direction:column-reverse}
.counts dt{color:var(--soft);font-size:.92rem}
.counts dd{margin:0;font-size:1.7rem;line-height:1.1;font-variant-numeric:tabular-nums lining-nums}
.wide{overflow-x:auto;margin:.8rem 0}
table{border-collapse:collapse;font-size:.92rem;font-variant-numeric:tabular-nums lining-nums}
caption{text-align:left;padding-bottom:.3rem;max-width:min(44rem,calc(100vw - 2.5rem))}
th,td{text-align:left;vertical-align:top;padding:.28rem .8rem .28rem 0;border-bottom:1px solid var(--rule)}
thead th{border-bottom:1.5px solid var(--ink);white-space:nowrap}
th{font-weight:600}
.number{text-align:right;white-space:nowrap}
td.number,th.number{padding-left:.8rem}
.off{color:var(--soft)}
code,.hash{font:.86em/1.4 "DejaVu Sans Mono",Consolas,monospace}
.hash{overflow-wrap:anywhere}
td .hash{display:inline-block;min-width:11rem}
td{min-width:3.2rem;overflow-wrap:break-word}
pre{background:var(--sheet);border:1px solid var(--rule);padding:.6rem .8rem;overflow-x:auto;font:.86rem/1.45 "DejaVu Sans Mono",Consolas,monospace}
dl.facts{display:grid;grid-template-columns:max-content 1fr;gap:.15rem 1rem}
dl.facts dt{color:var(--soft)}
dl.facts dd{margin:0;overflow-wrap:anywhere}
figure{margin:1rem 0}
figcaption{font-size:.9rem;margin-top:.3rem}
.plates{display:grid;grid-template-columns:repeat(auto-fit,minmax(min(100%,24rem),1fr));gap:1rem 1.6rem}
.attrition{max-width:40rem}
svg{display:block;width:100%;height:auto;font:14px "DejaVu Sans",Verdana,Helvetica,sans-serif}
svg text{fill:var(--ink)}
svg .low{font-size:11px}
.axes rect{fill:none;stroke:var(--ink)}
.axes path{stroke:var(--ink);fill:none}
.axes text{font-size:12.5px}
.axes .label{font-size:14px}
.mark{fill:none;stroke-width:1.2}
.kept{fill:var(--kept);stroke:none}
.dropped{stroke:var(--dropped)}
.unjudged{stroke:var(--unjudged)}
.borderline-out{stroke:var(--borderline);stroke-width:1.8;fill:var(--sheet)}
.borderline-in{stroke:var(--borderline);stroke-width:1.8;fill:var(--borderline)}
.guide{fill:none;stroke:var(--ink);stroke-dasharray:6 4;stroke-width:1.1}
.density{fill:var(--kept)}
.level0{opacity:.3}.level1{opacity:.47}.level2{opacity:.64}.level3{opacity:.82}
.dots{stroke:var(--dropped);stroke-width:1.6}
.left{fill:var(--kept)}
.removed{fill:url(#hatch);stroke:var(--dropped)}
.hatch{stroke:var(--dropped);stroke-width:2.4}
.icon{display:inline-block;width:.95em;height:.95em;vertical-align:-.1em}
.legend>span{white-space:nowrap;margin-right:.7em}
@media (max-width:34rem){h1{font-size:1.5rem}dl.facts{grid-template-columns:1fr}dl.facts dd{margin-bottom:.4rem}}
@media print{@page{size:A4;margin:16mm}
:root{--paper:#fff;--sheet:#fff;--ink:#111;--soft:#444;--rule:#bbb;--link:#111;--warn:#7a2208;--warnpaper:#fff;--kept:#0e2c50;--borderline:#8f4d00;--dropped:#858073;--unjudged:#664a85}
html{color-scheme:light;font-size:10pt}h2{margin-top:1.6rem}.attrition{max-width:30rem}main,header,footer{max-width:none;padding:0}nav{display:none}
h2,h3,caption,thead,article>p{break-after:avoid}figure,tr,dl.facts{break-inside:avoid}.wide{overflow:visible}.plates{grid-template-columns:1fr 1fr}
table{font-size:8.5pt}figcaption{font-size:8.5pt}td,th{padding-right:.5rem}td.number,th.number{padding-left:.3rem}td .hash{min-width:0}}
`;
