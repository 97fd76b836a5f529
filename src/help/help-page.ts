import type { CatalogueEntry } from "../cells/catalogue-entry";
import { CAUTIONS } from "../cells/cautions";
import { laminarSection } from "./laminar-section";
import { turbulentSection } from "./turbulent-section";

/** The help page: every function's card on one page, each under an anchor of its name. Made at build time. */
export function helpPage(catalogue: readonly CatalogueEntry[]): string {
  const families = [...new Set(catalogue.map((e) => e.family))];
  const list = families
    .map((family) => {
      const links = catalogue.filter((e) => e.family === family).map((e) => `<li><a href="#${e.name}">${e.name}</a> – ${text(e.purpose)}</li>`);
      return `<h3>${text(family)}</h3><ul>${links.join("")}</ul>`;
    })
    .join("\n");
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Wallsheet: functions, limits and sources</title>
<style>
:root { color-scheme: light dark; }
body { font: 16px/1.5 system-ui, sans-serif; max-width: 48rem; margin: 24px auto; padding: 0 16px; }
code { font: 14px ui-monospace, monospace; overflow-wrap: anywhere; }
table { border-collapse: collapse; width: 100%; } th, td { text-align: left; vertical-align: top; padding: 4px 8px 4px 0; border-bottom: 1px solid #8886; }
article { margin-top: 40px; } .caution { border-left: 4px solid; padding-left: 12px; }
</style>
</head>
<body>
<h1>Wallsheet</h1>
<div class="caution">${CAUTIONS.map((c) => `<p>${text(c)}</p>`).join("")}</div>
<nav aria-label="Functions"><h2>Functions</h2><p><a href="#laminar-methods">Which laminar march?</a> · <a href="#turbulent-methods">Which turbulent march?</a></p>${list}</nav>
<main>
${laminarSection()}
${turbulentSection()}
${catalogue.map(card).join("\n")}
</main>
</body>
</html>
`;
}

function card(entry: CatalogueEntry): string {
  const call = entry.parameters.map((p) => (p.optional ? `[${p.name}]` : p.name)).join(", ");
  const rows = entry.parameters
    .map((p) => `<tr><th scope="row"><code>${text(p.name)}</code>${p.optional ? " (optional)" : ""}</th><td>${text(p.unit)}</td><td>${text(p.description)}</td></tr>`)
    .join("");
  const lines = (items: readonly string[]) => `<ul>${items.map((i) => `<li>${text(i)}</li>`).join("")}</ul>`;
  return `<article id="${entry.name}">
<h2>${entry.name}</h2>
<p><code>=WALL.${entry.name}(${text(call)})</code></p>
<p>${text(entry.purpose)}</p>
<table><thead><tr><th scope="col">argument</th><th scope="col">unit</th><th scope="col">meaning</th></tr></thead><tbody>${rows}</tbody></table>
<h3>Gives</h3><p>${text(entry.gives)} Unit: ${text(entry.resultUnit)}.</p>
<h3>Valid range and error</h3>${lines(entry.limits)}
<h3>Source</h3>${lines(entry.sources)}
<h3>Example</h3><ul>${entry.examples.map((e) => `<li><code>${text(e.formula)}</code> gives ${text(String(e.value))}</li>`).join("")}</ul>
</article>`;
}

function text(raw: string): string {
  return raw.replace(/&/g, "&amp;").replace(/</g, "&lt;").replace(/>/g, "&gt;").replace(/"/g, "&quot;");
}
