import type { HostValue } from "./sheet-host";

/** A heading row and rows as comma-separated text (RFC 4180): full digits, blank where a cell is blank, lines ended by CR LF. */
export function tableCsv(headings: readonly string[], rows: readonly (readonly HostValue[])[]): string {
  return [headings, ...rows].map((row) => row.map(field).join(",") + "\r\n").join("");
}

function field(value: HostValue): string {
  if (value === null) return "";
  if (typeof value === "number") return String(value);
  if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
  // A sheet that opens the file would take such text for a formula.
  const text = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text;
}
