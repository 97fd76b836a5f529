import { boxName, boxSize, cellName, type CellBox } from "./cell-reference";
import { formulaInputs } from "./formula-inputs";
import { placeKey } from "./place-key";
import { withoutBrokenBook, type formulaReader } from "./plain-formula";
import type { StoredValue } from "./read-sheet";
import { shownSpelling } from "./stored-spelling";
import type { WallCell } from "./wall-cells";

/** What is known of one of our functions; the catalogue's entries are such. */
export interface MethodRecord {
  /** Without the namespace, e.g. `THWAITES_MARCH`. */
  name: string;
  /** What it does, in a sentence. */
  purpose: string;
  limits: readonly string[];
  sources: readonly string[];
}

/** What the notes say besides what stands in the book. */
export interface NotesRequest {
  methods: readonly MethodRecord[];
  /** Version of Wallsheet. */
  version: string;
  /** Day of the copy as it is to stand in the notes, e.g. `2026-12-01`. */
  date: string;
  cautions: readonly string[];
  /** Warnings and notes about a cell, from its block of stored values (rows × columns, blank = null) or from elsewhere. */
  remarks(cell: WallCell, values: readonly (readonly StoredValue[])[]): { warnings: readonly string[]; notes: readonly string[] };
}

/** Rows of a block that are read for warnings; more no march has. */
const MOST_VALUES = 2_000_000;
const HEADINGS = ["sheet", "cell", "item", "text"];

/** The rows of the method notes: a head, then for each cell one row an item, so that a filter on any column finds what it should. */
export function methodNotes(
  cells: readonly WallCell[],
  remaining: readonly string[],
  read: ReturnType<typeof formulaReader>,
  blocks: ReadonlyMap<string, CellBox>,
  request: NotesRequest,
): { rows: string[][]; headingRows: number } {
  const { methods, version, date, cautions } = request;
  const names = methods.map((m) => `WALL.${m.name}`);
  const head = [
    [`Method notes: how the values of this copy were calculated. Wallsheet ${version}, ${date}.`],
    ["The cells below held formulas of Wallsheet; they hold plain values now and do not follow their inputs any more."],
    ...cautions.map((c) => [c]),
    ...(remaining.length > 0 ? [[`Still calling functions of Wallsheet, and without effect where they are missing: ${remaining.join("; ")}.`]] : []),
    [],
    HEADINGS,
  ];
  const spillOf = (sheet: string, cell: string) => {
    const box = blocks.get(placeKey(sheet, cell));
    return box && boxName(box);
  };
  const body = cells.flatMap((wall) => {
    const { sheet, cell, formula, box, functions } = wall;
    const several = functions.length > 1;
    const of = (name: string, text: string) => (several ? `${name}: ${text}` : text);
    const known = functions.map((name) => methods.find((m) => m.name === name) ?? { name, purpose: `${name} is unknown to this version of Wallsheet.`, limits: [], sources: [] });
    const { warnings, notes } = request.remarks(wall, blockValues(wall));
    const items: [string, string][] = [
      ["formula", shownSpelling(withoutBrokenBook(formula), names)],
      ["values in", boxName(box)],
      ...formulaInputs(formula, sheet.name, cell.reference, read, spillOf).map((text): [string, string] => ["input", text]),
      ...known.map((m): [string, string] => ["method", `${m.name}: ${m.purpose}`]),
      ...known.flatMap((m) => m.limits.map((text): [string, string] => ["valid range", of(m.name, text)])),
      ...known.flatMap((m) => m.sources.map((text): [string, string] => ["source", of(m.name, text)])),
      ...warnings.map((text): [string, string] => ["warning", text]),
      ...notes.map((text): [string, string] => ["note", text]),
    ];
    return items.map(([item, text]) => [sheet.name, cell.reference, item, text]);
  });
  return { rows: [...head, ...body], headingRows: head.length };
}

/** The stored values of a cell's block, rows × columns. */
export function blockValues({ sheet, box }: Pick<WallCell, "sheet" | "box">): StoredValue[][] {
  const rows = boxSize(box) > MOST_VALUES ? 1 : box.bottom - box.top + 1;
  const columns = boxSize(box) > MOST_VALUES ? 1 : box.right - box.left + 1;
  return Array.from({ length: rows }, (_, r) => Array.from({ length: columns }, (__, c) => sheet.cells.get(cellName(box.left + c, box.top + r))?.value ?? null));
}
