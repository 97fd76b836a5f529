import { inputCheck } from "../cells/sheet/input-check";
import type { CellBlock } from "./cell-block";
import { readAddress } from "./cell-block";
import { errorWords } from "./error-words";
import { callArguments, calledFunctions } from "./form-formula";
import type { HostCell, SheetHost, WallCell } from "./sheet-host";

export type Verdict = "error" | "warning" | "fine";

/** What the check found at one WALL cell. */
export interface CellFinding {
  readonly at: CellBlock;
  /** Functions the cell calls, in order. */
  readonly functions: readonly string[];
  readonly verdict: Verdict;
  /** Errors, states, warnings and input findings, a sentence each; empty where all is well. */
  readonly words: readonly string[];
}

/** Rows of a spill that are read for its states and notes. */
const MOST_ROWS = 5_000;
/** States in which a row's layer is not described as asked, or described with a caution. */
const TROUBLED = new Set(["separated", "out of range", "lifted off", "no solution", "bubble"]);
const TELLING = /WARNING|separation|leaves|range|no solution|lifts/i;
/** Functions whose first three arguments are stations, edge speed and viscosity. */
const MARCH = /_MARCH$/;

/** Goes through every WALL cell of the book, sheet by sheet: error, troubled rows, warnings in notes, and findings on a march's inputs. */
export async function checkBook(host: SheetHost, progress: (done: number, of: number) => void = () => {}): Promise<readonly CellFinding[]> {
  const cells = await host.wallCells();
  const out: CellFinding[] = [];
  for (const [i, cell] of cells.entries()) {
    progress(i, cells.length);
    out.push(await checkCell(host, cell));
  }
  progress(cells.length, cells.length);
  return out;
}

async function checkCell(host: SheetHost, cell: WallCell): Promise<CellFinding> {
  const functions = calledFunctions(cell.formula);
  const words: string[] = [];
  let verdict: Verdict = "fine";
  if (cell.error) {
    words.push(errorWords(cell.error));
    verdict = "error";
  } else {
    const found = tableFindings(await host.read({ ...cell.spill, bottom: Math.min(cell.spill.bottom, cell.spill.top + MOST_ROWS) }));
    if (found.length > 0) verdict = "warning";
    words.push(...found);
  }
  for (const name of functions.filter((f) => MARCH.test(f))) {
    const found = await inputFindings(host, cell, name);
    if (found.length > 0 && verdict === "fine") verdict = "warning";
    words.push(...found);
  }
  return { at: cell.at, functions, verdict, words };
}

/** Troubled rows by their count, and notes that tell of trouble, from a spilled table. */
function tableFindings(rows: readonly (readonly HostCell[])[]): string[] {
  const heads = rows[0]?.map((cell) => cell.text) ?? [];
  const state = heads.indexOf("state");
  const note = heads.indexOf("note");
  const counts = new Map<string, number>();
  const words: string[] = [];
  for (const row of rows.slice(1)) {
    const at = state < 0 ? "" : (row[state]?.text ?? "");
    if (TROUBLED.has(at)) counts.set(at, (counts.get(at) ?? 0) + 1);
  }
  for (const [word, count] of counts) words.push(`${count} ${count === 1 ? "row is" : "rows are"} ${word}`);
  // The first row's note holds the settings.
  if (note >= 0) for (const row of rows.slice(2)) if (TELLING.test(row[note]?.text ?? "")) words.push(row[note]!.text);
  return words;
}

/** Findings of INPUT_CHECK on the plain ranges a march is called with; none where its arguments are made by other formulas. */
async function inputFindings(host: SheetHost, cell: WallCell, name: string): Promise<string[]> {
  const written = callArguments(cell.formula, `WALL.${name}`) ?? [];
  const values: unknown[] = [];
  for (const text of written.slice(0, 3)) {
    const block = readAddress(text, cell.at.sheet);
    if (block !== undefined) values.push((await host.read(block)).map((row) => row.map((c) => c.value)));
    else if (text !== "" && Number.isFinite(Number(text))) values.push(Number(text));
    else return [];
  }
  if (values.length < 3) return [];
  const table = inputCheck(values[0] as never, values[1] as never, values[2], {} as never) as string[][];
  const verdict = table[1]?.[1] ?? "";
  if (verdict === "usable") return [];
  return [`input ${verdict}`, ...table.slice(2).filter(([, , advice]) => advice !== "").map(([check, finding, advice]) => `${check}: ${finding} (${advice})`)];
}
