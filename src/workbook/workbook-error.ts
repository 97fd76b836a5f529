/** A file that cannot be read as a workbook; the message is one sentence for the user. */
export class WorkbookError extends Error {
  override name = "WorkbookError";
}
