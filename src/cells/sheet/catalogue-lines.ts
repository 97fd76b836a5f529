import type { CatalogueEntry } from "../catalogue-entry";
import { cellError } from "../errors/cell-error";
import { catalogue } from "../generated/catalogue";
import type { Call } from "../reading/call";
import { nearestWord } from "../reading/nearest-word";
import { readOptionalText } from "../reading/read-value";
import type { Cell } from "../writing/spill-table";

/** Lines of one catalogue entry as a spilled column; the name may carry `WALL.` and any case. */
export function catalogueLines(call: Call, name: unknown, lines: (entry: CatalogueEntry) => readonly string[]): Cell[][] {
  const written = readOptionalText(call, "name", name);
  if (written === undefined) throw cellError("#VALUE!", `${call.name} needs name; it is missing or blank`);
  const wanted = written.toUpperCase().replace(/^=?\s*WALL\./, "").replace(/\(.*$/, "");
  const entry = catalogue.find((e) => e.name === wanted);
  if (entry) return lines(entry).map((line) => [line]);
  const nearest = nearestWord(wanted, catalogue.map((e) => e.name));
  throw cellError("#N/A", `${call.name} needs the name of a WALL function; "${written}" is none, nearest is ${nearest}`);
}
