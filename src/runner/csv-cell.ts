/** A cell of a CSV file; text that a spreadsheet would run as a formula is kept from it by an apostrophe. */
export function csvCell(text: string, isText = true): string {
  const safe = isText && /^[=+\-@\t\r]/.test(text) ? "'" + text : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replace(/"/g, '""')}"` : safe;
}
