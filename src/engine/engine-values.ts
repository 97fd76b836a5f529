import { SheetError, type SheetValue } from "./sheet-function";
import type { EngineArgument, EngineMatrix, EngineValue } from "./types";

/** Error codes of the engine (19.3.7, `CellErrorType`) and what Excel calls them. */
const ENGINE_TO_EXCEL: Readonly<Record<string, string>> = {
  "#ERROR": "#VALUE!",
  "#REF": "#REF!",
  "#BAD_EXPR": "#NAME?",
  "#CYCLE": "#REF!",
  "#N/A": "#N/A",
  "#NAME?": "#NAME?",
  "#DIV/0!": "#DIV/0!",
  "#NUM!": "#NUM!",
  "#NULL!": "#NULL!",
  "#SPILL!": "#SPILL!",
};

const EXCEL_TO_ENGINE: Readonly<Record<string, string>> = {
  "#VALUE!": "#ERROR",
  "#REF!": "#REF",
  "#NAME?": "#NAME?",
  "#N/A": "#N/A",
  "#DIV/0!": "#DIV/0!",
  "#NUM!": "#NUM!",
  "#NULL!": "#NULL!",
  "#SPILL!": "#SPILL!",
  "#CALC!": "#ERROR",
  "#BLOCKED!": "#ERROR",
  "#FIELD!": "#ERROR",
  "#CONNECT!": "#ERROR",
  "#BUSY!": "#ERROR",
  "#GETTING_DATA": "#N/A",
};

/** Codes only newer Excel versions show; a workbook file stores `#VALUE!` in their place. */
const STORED_AS_VALUE = new Set(["#SPILL!", "#CALC!", "#BLOCKED!", "#FIELD!", "#CONNECT!", "#BUSY!"]);

/** True for a value object of the engine that is an error. */
export function isEngineError(value: EngineArgument): value is EngineValue & { value: string } {
  return value !== undefined && !Array.isArray(value) && typeof value.value === "string" && value.value in ENGINE_TO_EXCEL;
}

/** `#ERROR` → `#VALUE!`, `#REF` → `#REF!` and so on; an unknown code becomes `#VALUE!`. */
export function excelErrorCode(engineCode: string): string {
  return ENGINE_TO_EXCEL[engineCode] ?? (engineCode in EXCEL_TO_ENGINE ? engineCode : "#VALUE!");
}

/** `#VALUE!` → `#ERROR`, `#REF!` → `#REF` and so on; an unknown code becomes `#ERROR`. */
export function engineErrorCode(excelCode: string): string {
  return EXCEL_TO_ENGINE[excelCode] ?? (excelCode in ENGINE_TO_EXCEL ? excelCode : "#ERROR");
}

/** The code as a workbook file's `<c t="e">` may hold it. */
export function storedErrorCode(excelCode: string): string {
  return STORED_AS_VALUE.has(excelCode) ? "#VALUE!" : excelCode;
}

/** One engine value as a plain cell value; an error becomes a `SheetError` with Excel's code and the engine's sentence. */
export function sheetValue(value: EngineValue | undefined): SheetValue {
  if (value === undefined || value.value === null || value.value === undefined) return null;
  if (isEngineError(value)) return new SheetError(excelErrorCode(value.value), value.message ? String(value.message) : "");
  if (typeof value.value === "number" && !Number.isFinite(value.value)) return new SheetError("#NUM!", "The number is too large.");
  return value.value;
}

/** An engine matrix ([column][row]) as rows × columns of plain values. */
export function sheetRows(matrix: EngineMatrix): SheetValue[][] {
  const columns = matrix.length;
  const rows = columns === 0 ? 0 : matrix[0]!.length;
  const table: SheetValue[][] = new Array(rows);
  for (let r = 0; r < rows; r++) {
    const row: SheetValue[] = new Array(columns);
    for (let c = 0; c < columns; c++) row[c] = sheetValue(matrix[c]![r]);
    table[r] = row;
  }
  return table;
}

/** A plain cell value as the engine holds it. A number that is not finite is `#NUM!`, never passed on. */
export function engineValue(value: unknown): EngineValue {
  if (value === null || value === undefined) return { value: "" };
  if (value instanceof SheetError) return { value: engineErrorCode(value.code), message: value.message };
  if (typeof value === "number") return Number.isFinite(value) ? { value } : { value: "#NUM!", message: "The result is not a finite number." };
  if (typeof value === "string" || typeof value === "boolean") return { value };
  if (typeof value === "bigint") return engineValue(Number(value));
  if (typeof value === "object" && "code" in value && typeof value.code === "string") {
    return { value: engineErrorCode(value.code), message: "message" in value ? String(value.message) : "" };
  }
  return { value: "#ERROR", message: `A cell cannot hold a ${typeof value}.` };
}

/** Rows × columns as an engine matrix ([column][row]); short rows are filled with empty text. */
export function engineMatrix(rows: readonly (readonly unknown[])[]): EngineMatrix {
  const columns = rows.reduce((widest, row) => Math.max(widest, row.length), 0);
  return Array.from({ length: columns }, (_, c) => rows.map((row) => engineValue(row[c])));
}
