/** What one cell holds once the hosts' differences are gone. */
export type CellValue =
  | { kind: "number"; value: number }
  | { kind: "text"; value: string }
  | { kind: "flag"; value: boolean }
  | { kind: "blank" }
  | { kind: "error"; code: string };

/**
 * The one judge of a cell's content. Blank cells arrive as null, undefined or ""; rich cells as objects with a
 * basicValue; error cells as objects with a code.
 */
export function cellValue(raw: unknown): CellValue {
  if (raw === null || raw === undefined || raw === "") return { kind: "blank" };
  if (typeof raw === "number") return { kind: "number", value: raw };
  if (typeof raw === "boolean") return { kind: "flag", value: raw };
  if (typeof raw === "string") return raw.trim() === "" ? { kind: "blank" } : { kind: "text", value: raw };
  if (typeof raw === "object") {
    const rich = raw as { basicValue?: unknown; code?: unknown; errorType?: unknown };
    if (typeof rich.code === "string") return { kind: "error", code: rich.code };
    if (rich.basicValue !== undefined) {
      if (rich.errorType !== undefined && typeof rich.basicValue === "string") return { kind: "error", code: rich.basicValue };
      return cellValue(rich.basicValue);
    }
  }
  return { kind: "error", code: "an unknown kind of value" };
}

/** Words for a cell that holds no number: `is blank`, `holds the text "abc"`, … */
export function describeCell(cell: CellValue): string {
  switch (cell.kind) {
    case "blank":
      return "is blank";
    case "text":
      return `holds the text "${cell.value.length > 24 ? cell.value.slice(0, 24) + "…" : cell.value}"`;
    case "flag":
      return `holds ${cell.value ? "TRUE" : "FALSE"}`;
    case "error":
      return `holds ${cell.code}`;
    case "number":
      return Number.isFinite(cell.value) ? `has ${cell.value}` : "holds no finite number";
  }
}

/** A range or a single value as rows of cells; undefined for an omitted argument. */
export function cellRows(raw: unknown): readonly (readonly unknown[])[] | undefined {
  if (raw === null || raw === undefined) return undefined;
  if (!Array.isArray(raw)) return [[raw]];
  if (raw.length === 0) return undefined;
  return Array.isArray(raw[0]) ? (raw as unknown[][]) : [raw as unknown[]];
}
