/** LAMBDA values and the functions that call them, on the engine's value objects ([column][row]). */
import type { EngineArgument, EngineMatrix, EngineValue } from "./types";

export type LambdaCall = (...args: EngineArgument[]) => EngineArgument;

/** A function as a value: what a cell shows when it is not called is an error with a sentence. */
export interface LambdaValue extends EngineValue {
  lambda: LambdaCall;
}

/** Arrays larger than this are refused before they are built; a sheet has no room for them. */
const LARGEST_ARRAY = 10_000_000;

export function lambdaValue(lambda: LambdaCall): LambdaValue {
  return { value: "#ERROR", message: "A LAMBDA gives a value only when it is called.", lambda };
}

export function isLambda(argument: EngineArgument): argument is LambdaValue {
  return argument !== undefined && !Array.isArray(argument) && "lambda" in argument;
}

/** Calls what should be a LAMBDA; gives the error it is instead, or says that a LAMBDA is needed. */
export function callLambda(candidate: EngineArgument, args: EngineArgument[]): EngineArgument {
  const single = Array.isArray(candidate) ? candidate[0]?.[0] : candidate;
  if (isLambda(single)) return single.lambda(...args);
  return single !== undefined && isErrorText(single.value) ? single : fault("A LAMBDA is needed here.");
}

export function matrixOf(argument: EngineArgument): EngineMatrix {
  return Array.isArray(argument) ? argument : [[argument ?? { value: null }]];
}

export function scalarOf(argument: EngineArgument): EngineValue {
  return (Array.isArray(argument) ? argument[0]?.[0] : argument) ?? { value: null };
}

/** The functions that take a LAMBDA, by name; each gets its arguments already evaluated. */
export const LAMBDA_FUNCTIONS: Readonly<Record<string, (args: EngineArgument[]) => EngineArgument>> = { MAP: map, REDUCE: reduce, SCAN: scan, MAKEARRAY: makeArray, BYROW: byRow, BYCOL: byColumn };

function map(args: EngineArgument[]): EngineArgument {
  if (args.length < 2) return fault("MAP needs an array and a LAMBDA.");
  const lambda = args.at(-1);
  const arrays = args.slice(0, -1).map(matrixOf);
  const columns = Math.max(...arrays.map((array) => array.length));
  const rows = Math.max(...arrays.map((array) => array[0]?.length ?? 0));
  return build(columns, rows, (c, r) => callLambda(lambda, arrays.map((array) => array[c]?.[r] ?? { value: "#N/A", message: "MAP's arrays differ in size." })));
}

function reduce([initial, array, lambda]: EngineArgument[]): EngineArgument {
  const values = rowFirst(matrixOf(array));
  let total: EngineArgument = initial ?? values.shift();
  for (const value of values) total = callLambda(lambda, [total, value]);
  return total ?? fault("REDUCE has nothing to reduce.");
}

function scan([initial, array, lambda]: EngineArgument[]): EngineArgument {
  const source = matrixOf(array);
  const result: EngineMatrix = source.map((column) => new Array<EngineValue>(column.length));
  let total: EngineArgument = initial;
  let first = initial === undefined;
  for (let r = 0; r < (source[0]?.length ?? 0); r++) {
    for (let c = 0; c < source.length; c++) {
      total = first ? source[c]![r] : callLambda(lambda, [total, source[c]![r]]);
      first = false;
      result[c]![r] = single(total);
    }
  }
  return result;
}

function makeArray([rows, columns, lambda]: EngineArgument[]): EngineArgument {
  const [height, width] = [scalarOf(rows), scalarOf(columns)].map((size) => Math.trunc(Number(size.value)));
  if (!(height! >= 1 && width! >= 1)) return fault("MAKEARRAY needs at least 1 row and 1 column.");
  if (height! * width! > LARGEST_ARRAY) return fault("MAKEARRAY is asked for more cells than a sheet can show.", "#NUM!");
  return build(width!, height!, (c, r) => callLambda(lambda, [{ value: r + 1 }, { value: c + 1 }]));
}

function byRow([array, lambda]: EngineArgument[]): EngineArgument {
  const source = matrixOf(array);
  return build(1, source[0]?.length ?? 0, (_, r) => callLambda(lambda, [source.map((column) => [column[r]!])]));
}

function byColumn([array, lambda]: EngineArgument[]): EngineArgument {
  const source = matrixOf(array);
  return build(source.length, 1, (c) => callLambda(lambda, [[source[c]!]]));
}

function build(columns: number, rows: number, cell: (column: number, row: number) => EngineArgument): EngineMatrix {
  const result: EngineMatrix = Array.from({ length: columns }, () => new Array<EngineValue>(rows));
  for (let r = 0; r < rows; r++) for (let c = 0; c < columns; c++) result[c]![r] = single(cell(c, r));
  return result;
}

/** One element of an array; an array cannot be an element of another (#CALC! in Excel). */
function single(argument: EngineArgument): EngineValue {
  if (Array.isArray(argument) && (argument.length > 1 || (argument[0]?.length ?? 0) > 1)) return fault("A LAMBDA must give one value for each element, not an array.");
  return scalarOf(argument);
}

function rowFirst(matrix: EngineMatrix): EngineValue[] {
  const values: EngineValue[] = [];
  for (let r = 0; r < (matrix[0]?.length ?? 0); r++) for (const column of matrix) values.push(column[r]!);
  return values;
}

function isErrorText(value: unknown): boolean {
  return typeof value === "string" && value.startsWith("#");
}

function fault(message: string, value = "#ERROR"): EngineValue {
  return { value, message };
}
