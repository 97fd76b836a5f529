import { catalogue } from "../cells/generated/catalogue";
import { wallFunctions } from "../cells/generated/functions";
import type { CatalogueEntry } from "../cells/catalogue-entry";
import type { SheetFunction } from "./sheet-function";

/** The namespace under which every host shows the cell functions. */
export const NAMESPACE = "WALL";

/** The heading under which the bench's function menu lists them. */
const CATEGORY = "Wall layer";

type CellFunction = (...args: unknown[]) => unknown;

/** The cell functions of the catalogue as worksheet functions, called as Excel calls them. */
export function wallSheetFunctions(): SheetFunction[] {
  return catalogue.map((entry) => {
    const cellFunction = wallFunctions[entry.name] as CellFunction | undefined;
    if (!cellFunction) throw new Error(`The catalogue lists ${entry.name}, but no such cell function is compiled in; run \`npm run record\`.`);
    return wallSheetFunction(entry, cellFunction);
  });
}

/**
 * One cell function as a worksheet function: an omitted argument becomes null, error cells stay objects with a `code`, and the
 * last argument is the invocation with the address of each argument, as in Excel.
 */
export function wallSheetFunction(entry: CatalogueEntry, cellFunction: CellFunction): SheetFunction {
  return {
    name: `${NAMESPACE}.${entry.name}`,
    description: entry.purpose,
    category: CATEGORY,
    parameters: entry.parameters.map(({ name, description, unit, optional }) => ({ name, description: unit ? `${description} [${unit}]` : description, optional })),
    call(args, addresses) {
      const given = entry.parameters.map((_, i) => args[i] ?? null);
      return cellFunction(...given, { parameterAddresses: entry.parameters.map((_, i) => addresses[i] ?? "") });
    },
  };
}
