/** A worksheet function as every host of ours sees it: no engine type appears here. */

/** An error cell handed to a function, or an error inside a result. Codes are Excel's, e.g. `#DIV/0!`. */
export class SheetError {
  constructor(
    readonly code: string,
    readonly message: string = "",
  ) {}

  toString(): string {
    return this.code;
  }
}

/** What one cell may hold. A blank cell is null. */
export type SheetValue = number | string | boolean | null | SheetError;

export interface SheetFunctionParameter {
  readonly name: string;
  readonly description: string;
  readonly optional: boolean;
}

/**
 * `args[i]` is undefined when the argument was omitted, otherwise rows × columns of `SheetValue`; a single cell or a scalar
 * arrives as `[[value]]`. `addresses[i]` is A1 text with the sheet's name (`Sheet1!A2:A9`, `'My sheet'!B3`) where the argument
 * was a range, otherwise undefined. The result is a scalar or rows × columns; an error is thrown as an object with Excel's
 * `code` and a `message` sentence.
 */
export interface SheetFunction {
  /** With the namespace, e.g. `WALL.THWAITES_MARCH`. */
  name: string;
  description: string;
  category: string;
  parameters: readonly SheetFunctionParameter[];
  call(args: readonly unknown[], addresses: readonly (string | undefined)[]): unknown;
}
