import temml from "temml";
import type { CatalogueEntry } from "../cells/catalogue-entry";
import { CAUTIONS } from "../cells/cautions";
import { FUNCTION_EQUATIONS } from "./equations/function-equations";
import type { Equation } from "./equations/equation";
import { pageFrame, pageText } from "./page-frame";

/** One function's page, from its comment: call, arguments, equations, valid range, sources, example, neighbours, cautions. */
export function functionPage(entry: CatalogueEntry, catalogue: readonly CatalogueEntry[]): string {
  const equations = FUNCTION_EQUATIONS[entry.name] ?? [];
  const near = catalogue.filter((e) => e.family === entry.family && e.name !== entry.name);
  return pageFrame(
    `${entry.name} – Wallsheet`,
    `<nav><a href="../help.html">All functions</a></nav>
<main>
${functionCard(entry, equations)}
${near.length > 0 ? `<h2>See also</h2><ul>${near.map((e) => `<li><a href="${e.name}.html">${e.name}</a> – ${pageText(e.purpose)}</li>`).join("")}</ul>` : ""}
</main>
<div class="caution">${CAUTIONS.map((c) => `<p>${pageText(c)}</p>`).join("")}</div>`,
  );
}

/** The card of a function as it stands on its page. */
function functionCard(entry: CatalogueEntry, equations: readonly Equation[]): string {
  const call = entry.parameters.map((p) => (p.optional ? `[${p.name}]` : p.name)).join(", ");
  const rows = entry.parameters
    .map((p) => `<tr><th scope="row"><code>${pageText(p.name)}</code>${p.optional ? " (optional)" : ""}</th><td>${pageText(p.unit)}</td><td>${pageText(p.description)}</td></tr>`)
    .join("");
  const lines = (items: readonly string[]) => `<ul>${items.map((i) => `<li>${pageText(i)}</li>`).join("")}</ul>`;
  return `<h1>${entry.name}</h1>
<p>${pageText(entry.family)}</p>
<p><code>=WALL.${entry.name}(${pageText(call)})</code></p>
<p>${pageText(entry.purpose)}</p>
<table><thead><tr><th scope="col">argument</th><th scope="col">unit</th><th scope="col">meaning</th></tr></thead><tbody>${rows}</tbody></table>
<h2>Gives</h2><p>${pageText(entry.gives)} Unit: ${pageText(entry.resultUnit)}.</p>
${equations.length > 0 ? `<h2>Equations</h2>${equations.map(equationFigure).join("")}` : ""}
<h2>Valid range and error</h2>${lines(entry.limits)}
<h2>Source</h2>${lines(entry.sources)}
<h2>Example</h2><ul>${entry.examples.map((e) => `<li><code>${pageText(e.formula)}</code> gives ${pageText(String(e.value))}</li>`).join("")}</ul>`;
}

function equationFigure({ words, tex }: Equation): string {
  return `<figure><figcaption>${pageText(words)}</figcaption>${upright(temml.renderToString(tex, { displayMode: true, throwOnError: true, xml: false }))}</figure>`;
}

/** Single letters as they are, not as letters of the mathematical alphabets, which many machines have no font for. */
function upright(math: string): string {
  return math.replace(/<mi>/g, '<mi mathvariant="normal">');
}
