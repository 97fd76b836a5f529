import type { CatalogueEntry } from "../cells/catalogue-entry";
import { OPTION_VOCABULARY } from "../cells/reading/option-vocabulary";

/** The option labels a function takes, in the order in which its comment names them; none where it takes no options. */
export function optionLabels(entry: CatalogueEntry): string[] {
  const about = entry.parameters.find((p) => p.name === "options")?.description ?? "";
  const known = Object.keys(OPTION_VOCABULARY);
  const plain = about.replace(/\([^)]*\)/g, ""); // the choices of a label stand in brackets
  const found = known.flatMap((label) => {
    const at = plain.search(new RegExp(`(?:^|[:,]|\\bor|\\bwith)\\s*${label}\\s*(?=[,.;=]|\\bor\\b|\\bwith\\b|$)`));
    return at < 0 ? [] : [{ label, at }];
  });
  return found.sort((a, b) => a.at - b.at).map((f) => f.label);
}
