import type { CatalogueEntry } from "../cells/catalogue-entry";
import { CAUTIONS } from "../cells/cautions";
import { laminarSection } from "./laminar-section";
import { pageFrame, pageText } from "./page-frame";
import { turbulentSection } from "./turbulent-section";

/** The index of the help: functions by subject, each under an anchor of its name with the way to its page, and which method to take. Made at build time. */
export function helpPage(catalogue: readonly CatalogueEntry[]): string {
  const families = [...new Set(catalogue.map((e) => e.family))];
  const list = families
    .map((family) => {
      const links = catalogue.filter((e) => e.family === family).map((e) => `<li id="${e.name}"><a href="help/${e.name}.html">${e.name}</a> – ${pageText(e.purpose)}</li>`);
      return `<h3>${pageText(family)}</h3><ul>${links.join("")}</ul>`;
    })
    .join("\n");
  return pageFrame(
    "Wallsheet: functions, limits and sources",
    `<h1>Wallsheet</h1>
<div class="caution">${CAUTIONS.map((c) => `<p>${pageText(c)}</p>`).join("")}</div>
<nav aria-label="Functions"><h2>Functions</h2><p><a href="#laminar-methods">Which laminar march?</a> · <a href="#turbulent-methods">Which turbulent march?</a></p>${list}</nav>
<main>
${laminarSection()}
${turbulentSection()}
</main>`,
  );
}
