import { readAddress } from "../pane/cell-block";
import type { SheetHost } from "../pane/sheet-host";
import { excelChart } from "./excel-chart";
import { rangeOf } from "./range-of";
import { readBlock } from "./read-block";
import { tableAt } from "./table-at";
import { wallCellsOf } from "./wall-cells-of";

/** The pane's SheetHost on Office.js. Every method is one batch, with as few round trips as its answers allow. */
export function excelSheetHost(): SheetHost {
  return {
    name: "Excel",
    selection: () =>
      batch(async (context) => {
        const range = context.workbook.getSelectedRange();
        range.load("address");
        range.worksheet.load("name");
        await context.sync();
        const block = readAddress(range.address, range.worksheet.name);
        if (!block) throw new Error(`Excel names the selection ${range.address}, which is not one block of cells.`);
        return block;
      }),
    read: (block) => batch((context) => readBlock(context, block)),
    writeFormula: (at, formula) =>
      batch(async (context) => {
        rangeOf(context, { ...at, right: at.left, bottom: at.top }).formulas = [[formula]];
        await context.sync();
        if (/\bWALL\./i.test(formula)) await loadWithBook();
      }),
    writeValues: (at, rows) =>
      batch(async (context) => {
        const width = Math.max(0, ...rows.map((row) => row.length));
        if (width === 0) return;
        const block = { ...at, right: at.left + width - 1, bottom: at.top + rows.length - 1 };
        rangeOf(context, block).values = rows.map((row) => Array.from({ length: width }, (_, i) => asText(row[i] ?? "")));
        await context.sync();
      }),
    insertChart: (chart) => batch((context) => excelChart(context, chart)),
    wallCells: () => batch(wallCellsOf),
    tableAt: (at) => batch((context) => tableAt(context, at)),
    // No saveFile: the desktop hosts' web view drops downloads without a word.
    goTo: (block) =>
      batch(async (context) => {
        context.workbook.worksheets.getItem(block.sheet).activate();
        rangeOf(context, block).select();
        await context.sync();
      }),
    whenChanged: watch,
  };
}

let isLoadedWithBook = false;

/** Has Excel start the functions with this book from now on, so that they live when it is opened again. An Excel that cannot keeps its own way. */
async function loadWithBook(): Promise<void> {
  if (isLoadedWithBook || !Office.context?.requirements?.isSetSupported("SharedRuntime", "1.1")) return;
  await Office.addin.setStartupBehavior(Office.StartupBehavior.load);
  isLoadedWithBook = true;
}

/** Text that a sheet would take for a formula is written as text. */
function asText(value: number | string | boolean): number | string | boolean {
  return typeof value === "string" && /^[=+\-@']/.test(value) ? "'" + value : value;
}

/** One batch; a refusal of Excel's becomes a sentence. */
async function batch<T>(work: (context: Excel.RequestContext) => Promise<T>): Promise<T> {
  try {
    return await Excel.run(work);
  } catch (error) {
    throw new Error(sentenceFor(error), { cause: error });
  }
}

function sentenceFor(error: unknown): string {
  const { code, message } = error as { code?: string; message?: string };
  if (code === "InvalidSelection") return "Select one block of cells: several separate blocks cannot be read at once.";
  if (code === "AccessDenied") return "Excel refused the change: the sheet is protected, or a cell is being edited.";
  if (code === "InvalidOperationInCellEditMode") return "Excel is in the middle of editing a cell: finish it with Enter or Esc, then try again.";
  if (code === "ItemNotFound") return "The sheet is no longer in the workbook.";
  return message ?? String(error);
}

/** Listens to selection, entries and recalculation; gives the function that ends it. */
function watch(listener: () => void): () => void {
  const added = batch(async (context) => {
    const call = async () => listener();
    const handlers = [
      context.workbook.onSelectionChanged.add(call),
      context.workbook.worksheets.onChanged.add(call),
      context.workbook.worksheets.onCalculated.add(call),
    ];
    await context.sync();
    return handlers;
  }).catch((error: Error) => {
    // Excel refuses to be listened to: say so where it can be found, and let the pane read once, which shows the refusal itself.
    console.error(`Wallsheet cannot follow the sheet: ${error.message}`);
    listener();
    return [];
  });
  return () => {
    void added.then(([first, ...rest]) =>
      first === undefined
        ? undefined
        : Excel.run(first.context, async (context) => {
            for (const handler of [first, ...rest]) handler.remove();
            await context.sync();
          }),
    );
  };
}
