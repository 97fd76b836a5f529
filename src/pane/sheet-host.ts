import type { CellBlock } from "./cell-block";

/** What a cell holds; blank is null. */
export type HostValue = number | string | boolean | null;

/** One cell as a host reads it. */
export interface HostCell {
  readonly value: HostValue;
  /** As the sheet shows it. */
  readonly text: string;
  /** With its leading `=`; only where the formula itself stands. */
  readonly formula?: string;
  /** Excel's code and, where the host knows it, the sentence. */
  readonly error?: { readonly code: string; readonly sentence: string };
  /** The cell whose formula spilled this one. */
  readonly spilledFrom?: CellBlock;
}

/** A cell whose formula calls a WALL function. */
export interface WallCell {
  readonly at: CellBlock;
  readonly formula: string;
  /** The whole spill; equal to `at` for a single value. */
  readonly spill: CellBlock;
  readonly error?: { readonly code: string; readonly sentence: string };
}

/** A chart of columns over one x column, headings excluded. */
export interface ChartRequest {
  readonly title: string;
  readonly x: CellBlock;
  readonly xLabel: string;
  readonly series: readonly { readonly label: string; readonly values: CellBlock }[];
  readonly yLabel: string;
  /** Cell at whose upper left corner the chart goes. */
  readonly at: CellBlock;
}

/**
 * What the pane needs of a sheet. Excel and the bench's grid each implement it; every method rejects with an Error whose message
 * is a sentence for the user.
 */
export interface SheetHost {
  /** As the pane names it, e.g. `Excel`. */
  readonly name: string;
  selection(): Promise<CellBlock>;
  /** Rows × columns of the block, clipped to the sheet's used part (never fewer than one row and one column). */
  read(block: CellBlock): Promise<readonly (readonly HostCell[])[]>;
  /** Puts one formula into the block's first cell, in one undoable step. */
  writeFormula(at: CellBlock, formula: string): Promise<void>;
  /** Puts values from the block's first cell on, in one undoable step. */
  writeValues(at: CellBlock, rows: readonly (readonly HostValue[])[]): Promise<void>;
  insertChart(chart: ChartRequest): Promise<void>;
  /** Every WALL cell of the book, sheet by sheet, row by row. */
  wallCells(): Promise<readonly WallCell[]>;
  /** The WALL cell that stands at the block's first cell or spills over it; undefined where neither is so. */
  tableAt(at: CellBlock): Promise<WallCell | undefined>;
  /** Gives the user a file to keep. Left out where the host lets no file out of its page; the pane then offers to copy instead. */
  saveFile?(name: string, content: Blob): Promise<void>;
  /** Selects the block and brings it into view. */
  goTo(block: CellBlock): Promise<void>;
  /** Calls back after the selection moved or cells changed; gives the function that ends it. */
  whenChanged(listener: () => void): () => void;
}
