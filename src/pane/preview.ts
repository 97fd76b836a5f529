import type { HostCell, SheetHost } from "./sheet-host";
import { readAddress } from "./cell-block";

/** Calls a compiled function by its name; throws an Error whose message is the function's sentence. */
export type CallFunction = (name: string, args: readonly unknown[]) => unknown;

/** First rows of what a formula would give, or why it cannot be shown yet. */
export type Preview = { readonly kind: "rows"; readonly rows: readonly (readonly HostCell["value"][])[]; readonly of: number } | { readonly kind: "fault"; readonly words: string } | { readonly kind: "none"; readonly words: string };

/** Rows and columns of a preview. */
const ROWS = 6;
const COLUMNS = 8;

/**
 * What a function gives for arguments as written: plain ranges are read from the sheet, numbers, texts in quotes and array constants are
 * taken as they stand. Arguments made by other formulas cannot be shown before they stand in a cell.
 */
export async function preview(host: SheetHost, call: CallFunction, name: string, written: readonly string[]): Promise<Preview> {
  const sheet = (await host.selection()).sheet;
  const args: unknown[] = [];
  for (const text of written) {
    const read = await argument(host, sheet, text);
    if (read === undefined) return { kind: "none", words: "No preview: an argument is a formula of its own. Insert it to see the result." };
    args.push(read.value);
  }
  let result: unknown;
  try {
    result = call(name, args);
  } catch (error) {
    return { kind: "fault", words: error instanceof Error ? error.message : String(error) };
  }
  const rows = (Array.isArray(result) ? (result as HostCell["value"][][]) : [[result as HostCell["value"]]]).map((row) => row.slice(0, COLUMNS));
  return { kind: "rows", rows: rows.slice(0, ROWS), of: rows.length };
}

async function argument(host: SheetHost, sheet: string, written: string): Promise<{ value: unknown } | undefined> {
  const text = written.trim();
  if (text === "") return { value: null };
  if (/^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i.test(text)) return { value: Number(text) };
  if (/^(TRUE|FALSE)$/i.test(text)) return { value: /^true$/i.test(text) };
  if (/^"(?:[^"]|"")*"$/.test(text)) return { value: text.slice(1, -1).replace(/""/g, '"') };
  const constant = arrayConstant(text);
  if (constant !== undefined) return { value: constant };
  const block = readAddress(text, sheet);
  return block === undefined ? undefined : { value: (await host.read(block)).map((row) => row.map((cell) => (cell.error ? { code: cell.error.code } : cell.value))) };
}

/** `{1,2;3,"a"}` as rows; undefined where it is none. */
function arrayConstant(text: string): unknown[][] | undefined {
  if (!/^\{.*\}$/s.test(text)) return undefined;
  const rows: unknown[][] = [[]];
  let ok = true;
  for (const [, item, mark] of text.slice(1, -1).matchAll(/\s*("(?:[^"]|"")*"|[^,;"]*)\s*([,;]|$)/g)) {
    if (item === undefined || (item === "" && mark === "")) continue;
    const value = /^"/.test(item) ? item.slice(1, -1).replace(/""/g, '"') : /^(true|false)$/i.test(item.trim()) ? /^true$/i.test(item.trim()) : Number(item);
    if (typeof value === "number" && (item.trim() === "" || !Number.isFinite(value))) ok = false;
    rows.at(-1)!.push(value);
    if (mark === ";") rows.push([]);
  }
  return ok && rows[0]!.length > 0 ? rows : undefined;
}
