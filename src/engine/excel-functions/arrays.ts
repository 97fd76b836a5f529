/** Array functions whose arguments mean something else in the engine (19.3.7) than in Excel, and those it lacks. */
import { isEngineError } from "../engine-values";
import type { EngineArgument, EngineLibrary, EngineMatrix, EngineValue } from "../types";
import { ExcelError, addMissing, define, numberOf, rowFirst } from "./define";
import { fail } from "./elementary";

const NOT_AVAILABLE: EngineValue = { value: "#N/A", message: "The arrays differ in size." };

export function installArrays(library: EngineLibrary): void {
  define(library, "SORT", "Sorts rows or columns.", ["array (any, range)", "sort_index (any, range, optional)", "sort_order (any, range, optional)", "by_column (boolean, optional)"], (array, index, order, byColumn) => {
    const lines = linesOf(matrixOf(array), truth(byColumn));
    const places = listOf(index, 1).map((n) => (n >= 1 && n <= (lines[0]?.length ?? 0) ? Math.trunc(n) - 1 : fail("SORT's index lies outside the array.", "#VALUE!")));
    const orders = listOf(order, 1).map(direction);
    return matrixFrom(sortLines(lines, places.map((place, i) => ({ keys: lines.map((line) => line[place]!), sign: orders[i] ?? orders[0]! }))), truth(byColumn));
  });
  define(library, "SORTBY", "Sorts rows or columns by other arrays.", ["array (any, range)", "by_array (any, range)", "order_and_more (any, range, optional, repeating)"], (array, ...rest) => {
    const matrix = matrixOf(array);
    const across = matrix.length > 1 && matrix[0]!.length === 1;
    const lines = linesOf(matrix, across);
    const keys = [];
    for (let i = 0; i < rest.length; i += 2) {
      const values = rowFirst(matrixOf(rest[i]));
      if (values.length !== lines.length) fail("SORTBY's arrays differ in length.", "#VALUE!");
      keys.push({ keys: values, sign: direction(numberOf(rest[i + 1], 1)) });
    }
    return matrixFrom(sortLines(lines, keys), across);
  });
  define(library, "FILTER", "Rows or columns for which the test holds.", ["array (any, range)", "include (any, range)", "if_empty (any, range, optional)"], (array, include, ifEmpty) => {
    const matrix = matrixOf(array);
    const tests = matrixOf(include);
    const across = tests[0]!.length === 1 && tests.length === matrix.length && (tests.length > 1 || matrix[0]!.length > 1);
    const lines = linesOf(matrix, across);
    const kept = rowFirst(tests).map((test) => truth(test));
    if (kept.length !== lines.length) fail("FILTER needs one test for each row or column.", "#VALUE!");
    const left = lines.filter((_, i) => kept[i]);
    if (left.length > 0) return matrixFrom(left, across);
    return ifEmpty === undefined ? fail("FILTER finds nothing.", "#CALC!") : (ifEmpty as EngineValue);
  });
  define(library, "VSTACK", "Stacks arrays below one another.", ["array (any, range, repeating)"], (...arrays) => stack(arrays.map(matrixOf)));
  define(library, "HSTACK", "Stacks arrays beside one another.", ["array (any, range, repeating)"], (...arrays) => flip(stack(arrays.map((array) => flip(matrixOf(array))))));
  for (const [name, position] of [["WRAPROWS", 2], ["WRAPCOLS", 2], ["EXPAND", 3]] as const) padWithNotAvailable(library, name, position);
  addMissing(library, "XMATCH", "Place of a value in a list.", ["value (any)", "list (any, range)", "match (number, optional)", "search (number, optional)"], xmatch);
}

/** Excel pads with #N/A, the engine with 0. */
function padWithNotAvailable(library: EngineLibrary, name: string, position: number): void {
  const registry = library.registries.functionRegistry;
  const entry = registry.content[name]!;
  const original = entry.compute;
  registry.replace(name, {
    ...entry,
    compute(...args) {
      while (args.length < position) args.push(undefined);
      return original.apply(this, [...args.slice(0, position), args[position] ?? { value: "#N/A", message: "There is nothing to fill this place with." }]);
    },
  });
}

function stack(matrices: EngineMatrix[]): EngineMatrix {
  const columns = Math.max(...matrices.map((matrix) => matrix.length));
  return Array.from({ length: columns }, (_, c) => matrices.flatMap((matrix) => matrix[c] ?? new Array<EngineValue>(matrix[0]!.length).fill(NOT_AVAILABLE)));
}

function sortLines(lines: EngineValue[][], by: readonly { keys: readonly EngineValue[]; sign: number }[]): EngineValue[][] {
  const order = lines.map((_, i) => i);
  order.sort((a, b) => {
    for (const { keys, sign } of by) {
      const [p, q] = [keys[a]!, keys[b]!];
      // Blanks stay last whichever way the sort goes.
      const difference = p.value === null || q.value === null ? Number(p.value === null) - Number(q.value === null) : sign * compare(p, q);
      if (difference !== 0) return difference;
    }
    return a - b;
  });
  return order.map((i) => lines[i]!);
}

/** Excel's order: numbers, texts in any case, truth values, errors. */
export function compare(a: EngineValue, b: EngineValue): number {
  const kinds = kind(a) - kind(b);
  if (kinds !== 0) return kinds;
  if (typeof a.value === "string" && !isEngineError(a)) return a.value.toLowerCase().localeCompare(String(b.value).toLowerCase(), "en");
  return isEngineError(a) ? 0 : Number(a.value) - Number(b.value);
}

function kind(value: EngineValue): number {
  return isEngineError(value) ? 3 : typeof value.value === "number" ? 0 : typeof value.value === "string" ? 1 : typeof value.value === "boolean" ? 2 : 4;
}

function xmatch(value: EngineArgument, list: EngineArgument, match: EngineArgument, search: EngineArgument): number {
  const sought = Array.isArray(value) ? value[0]![0]! : (value ?? { value: null });
  if (isEngineError(sought)) throw new ExcelError(sought.value, sought.message ?? sought.value);
  const values = rowFirst(matrixOf(list));
  const mode = numberOf(match);
  const wild = mode === 2 && typeof sought.value === "string" ? wildcard(sought.value) : undefined;
  const order = values.map((_, i) => i);
  if (numberOf(search, 1) < 0) order.reverse();
  let nearest = -1;
  for (const i of order) {
    const candidate = values[i]!;
    if (kind(candidate) !== kind(sought)) continue;
    if (wild ? wild.test(String(candidate.value)) : compare(candidate, sought) === 0) return i + 1;
    const side = Math.sign(compare(candidate, sought));
    if ((mode === -1 || mode === 1) && side === mode && (nearest < 0 || Math.sign(compare(candidate, values[nearest]!)) === -mode)) nearest = i;
  }
  return nearest < 0 ? fail("The value is not in the list.", "#N/A") : nearest + 1;
}

function wildcard(pattern: string): RegExp {
  const source = pattern.replace(/~([*?~])|([*?])|[\\^$.|+()[\]{}]/g, (all, literal: string | undefined, mark: string | undefined) => (literal ? `\\${literal}` : mark === "*" ? ".*" : mark === "?" ? "." : `\\${all}`));
  return new RegExp(`^${source}$`, "is");
}

function direction(order: number): number {
  return order === 1 || order === -1 ? order : fail("The order must be 1 or -1.", "#VALUE!");
}

function listOf(argument: EngineArgument, missing: number): number[] {
  return argument === undefined ? [missing] : Array.isArray(argument) ? rowFirst(argument).map((value) => numberOf(value)) : [numberOf(argument)];
}

function truth(argument: EngineArgument): boolean {
  return numberOf(argument) !== 0;
}

function matrixOf(argument: EngineArgument): EngineMatrix {
  return Array.isArray(argument) ? argument : [[argument ?? { value: null }]];
}

/** Rows of a matrix, or its columns. */
function linesOf(matrix: EngineMatrix, columns: boolean): EngineValue[][] {
  return columns ? matrix : flip(matrix);
}

function matrixFrom(lines: EngineValue[][], columns: boolean): EngineMatrix {
  return columns ? lines : flip(lines);
}

function flip(matrix: EngineMatrix): EngineMatrix {
  return (matrix[0] ?? []).map((_, r) => matrix.map((column) => column[r]!));
}
