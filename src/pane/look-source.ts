import { readAddress } from "./cell-block";
import { calledFunctions, callArguments } from "./form-formula";
import { lookTable, type LookTable } from "./look-table";
import type { SheetHost, WallCell } from "./sheet-host";

/** Reads the table a WALL cell spills, with the row of cells above it and, where a function's first argument is a plain range, its stations. */
export async function readLookTable(host: SheetHost, cell: WallCell): Promise<LookTable | undefined> {
  const { spill } = cell;
  const block = await host.read(spill);
  const above = spill.top > 0 ? (await host.read({ ...spill, top: spill.top - 1, bottom: spill.top - 1 }))[0]!.map((c) => c.text) : [];
  return lookTable(block, above, await stationsOf(host, cell));
}

async function stationsOf(host: SheetHost, cell: WallCell): Promise<number[] | undefined> {
  for (const name of calledFunctions(cell.formula)) {
    const written = callArguments(cell.formula, `WALL.${name}`)?.[0] ?? "";
    // A filter that drops nothing leaves the stations as they are; one that does leaves another number of rows, which the reader sees.
    const range = readAddress(callArguments(written, "FILTER")?.[0] ?? written, cell.at.sheet);
    // Only a column: a row of stations spills another way round.
    if (range === undefined || range.left !== range.right) continue;
    const values = (await host.read(range)).map((row) => row[0]!.value);
    if (values.every((v) => typeof v === "number")) return values;
  }
  return undefined;
}
