import type { CellBlock } from "./cell-block";
import { findHeading } from "../cells/writing/headings";
import type { SheetHost } from "./sheet-host";

/** Columns that are drawn together, best first. */
const DRAWN: readonly (readonly string[])[] = [["momentum_loss", "defect"], ["amplification"], ["margin"], ["speed"], ["edge_speed"], ["value"]];
const PLACES = ["station", "height", "similar_height"];

/** Draws the first columns of a spilled table beside it by the host's own chart; false where the table has nothing to draw. */
export async function insertTableChart(host: SheetHost, at: CellBlock, title: string): Promise<boolean> {
  const table = await host.tableAt(at);
  if (!table || table.error || table.spill.bottom - table.spill.top < 2) return false;
  const { spill } = table;
  const heads = (await host.read({ ...spill, bottom: spill.top }))[0]!.map((cell) => cell.text);
  const keys = heads.map((text) => findHeading(text)?.key);
  const x = PLACES.map((key) => keys.indexOf(key as never)).find((i) => i >= 0);
  const drawn = DRAWN.map((group) => group.map((key) => keys.indexOf(key as never)).filter((i) => i >= 0)).find((group) => group.length > 0);
  if (x === undefined || drawn === undefined) return false;
  const column = (i: number): CellBlock => ({ sheet: spill.sheet, left: spill.left + i, right: spill.left + i, top: spill.top + 1, bottom: spill.bottom });
  await host.insertChart({
    title,
    x: column(x),
    xLabel: heads[x]!,
    series: drawn.map((i) => ({ label: heads[i]!, values: column(i) })),
    yLabel: drawn.map((i) => heads[i]!).join(", "),
    at: { sheet: spill.sheet, left: spill.right + 2, right: spill.right + 2, top: spill.top, bottom: spill.top },
  });
  return true;
}
