/** The two errors a cell function may give; only these carry a sentence in every host. */
export type ErrorCode = "#VALUE!" | "#N/A";

/** An error with the sentence a user reads in the cell. */
export class CellError extends Error {
  constructor(
    readonly code: ErrorCode,
    sentence: string,
  ) {
    super(sentence);
    this.name = "CellError";
  }
}

let make: (code: ErrorCode, sentence: string) => Error = (code, sentence) => new CellError(code, sentence);

/** A host that shows only errors of its own kind (Excel) says here how to make one. */
export function makeErrorsWith(maker: (code: ErrorCode, sentence: string) => Error): void {
  make = maker;
}

/** The error to throw from a cell function. */
export function cellError(code: ErrorCode, sentence: string): Error {
  return make(code, sentence);
}
