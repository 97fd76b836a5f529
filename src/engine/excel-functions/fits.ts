/** LINEST, LOGEST, TREND and GROWTH by orthogonal columns, laid out as Excel does; the engine (19.3.7) solves normal equations, which lose a cubic's digits. */
import { isEngineError } from "../engine-values";
import type { EngineArgument, EngineLibrary, EngineMatrix, EngineValue } from "../types";
import { correct, define, numberOf } from "./define";
import { fail } from "./elementary";
import { leastSquares, type LinearFit } from "./least-squares";

const NOTHING: EngineValue = { value: "#N/A", message: "The table of the fit has nothing to show here." };
const KNOWN = ["known_y (any, range)", "known_x (any, range, optional)"];

/** Data of a fit: the xs one after the other, and whether they lie beside one another. */
interface Data {
  y: number[];
  xs: number[][];
  columns: boolean;
}

export function installFits(library: EngineLibrary): void {
  for (const name of ["LINEST", "LOGEST"]) {
    const powers = name === "LOGEST";
    define(library, name, powers ? "Exponential curve through points, with statistics." : "Straight line or plane through points, with statistics.", [...KNOWN, "constant (any, optional)", "statistics (any, optional)"], (ys, xs, constant, statistics) => {
      const hasConstant = numberOf(constant, 1) !== 0;
      return table(leastSquares(...fitData(name, ys, xs, powers), hasConstant), powers, hasConstant, numberOf(statistics) !== 0);
    });
  }
  for (const name of ["TREND", "GROWTH"]) {
    const powers = name === "GROWTH";
    define(library, name, powers ? "Values on the exponential curve through points." : "Values on the straight line or plane through points.", [...KNOWN, "new_x (any, range, optional)", "constant (any, optional)"], (ys, xs, news, constant) => {
      const data = read(name, ys, xs, powers);
      const { coefficients, constant: b } = leastSquares(data.y, data.xs, numberOf(constant, 1) !== 0);
      const at = given(news) ? matrixOf(news) : given(xs) ? matrixOf(xs) : counted(matrixOf(ys));
      const value = (x: number[]): EngineValue => {
        const sum = x.reduce((s, v, j) => s + coefficients[j]! * v, b);
        return { value: powers ? Math.exp(sum) : sum };
      };
      if (coefficients.length === 1) return at.map((column) => column.map((cell) => value([numeric(name, cell)])));
      if ((data.columns ? at.length : at[0]!.length) !== coefficients.length) fail(`${name} needs as many new x as known ones.`, "#REF!");
      return data.columns ? [at[0]!.map((_, r) => value(at.map((column) => numeric(name, column[r]!))))] : at.map((column) => [value(column.map((cell) => numeric(name, cell)))]);
    });
  }
  correct(library, "MINVERSE", (result, [matrix]) => {
    const isSquare = Array.isArray(matrix) && matrix.length === matrix[0]!.length && matrix.every((column) => column.every((cell) => typeof cell.value === "number"));
    return isEngineError(result as EngineValue) && isSquare ? fail("The matrix has no inverse.") : undefined;
  });
}

function fitData(name: string, ys: EngineArgument, xs: EngineArgument, logarithms: boolean): [number[], number[][]] {
  const { y, xs: x } = read(name, ys, xs, logarithms);
  return [y, x];
}

function read(name: string, ys: EngineArgument, xs: EngineArgument, logarithms: boolean): Data {
  const written = matrixOf(ys);
  const x = given(xs) ? matrixOf(xs) : counted(written);
  const numbers = (cells: EngineValue[]) => cells.map((cell) => numeric(name, cell));
  const y = numbers(written.flat()).map((v) => (logarithms ? (v > 0 ? Math.log(v) : fail(`${name} needs known_y above 0.`)) : v));
  const [width, height] = [written.length, written[0]!.length];
  if (x.length === width && x[0]!.length === height) return { y, xs: [numbers(x.flat())], columns: width === 1 };
  if (width === 1 && x[0]!.length === height) return { y, xs: x.map(numbers), columns: true };
  if (height === 1 && x.length === width) return { y, xs: x[0]!.map((_, r) => numbers(x.map((column) => column[r]!))), columns: false };
  return fail(`${name} needs known_x as long as known_y.`, "#REF!");
}

/** Excel's table: the last x first, the constant last. */
function table(fit: LinearFit, powers: boolean, hasConstant: boolean, statistics: boolean): EngineMatrix {
  const { coefficients, errors, constant, constantError, residual, explained, freedom } = fit;
  const shown = (v: number): EngineValue => ({ value: powers ? Math.exp(v) : v });
  const columns = [...coefficients.map((b, j) => [shown(b), { value: errors[j]! }]).reverse(), [shown(constant), hasConstant ? { value: constantError } : NOTHING]];
  if (!statistics) return columns.map(([first]) => [first!]);
  const rank = Math.max(1, coefficients.filter((_, j) => coefficients[j] !== 0 || errors[j] !== 0).length);
  const ratio = (a: number, b: number): EngineValue => (b === 0 ? { value: "#NUM!", message: "The fit leaves nothing over to divide by." } : { value: a / b });
  const lower: EngineValue[][] = [
    [ratio(explained, explained + residual), ratio(explained / rank, freedom > 0 ? residual / freedom : 0), { value: explained }],
    [{ value: freedom > 0 ? Math.sqrt(residual / freedom) : 0 }, { value: freedom }, { value: residual }],
  ];
  return columns.map((column, c) => [...column, ...(lower[c] ?? [NOTHING, NOTHING, NOTHING])]);
}

/** 1, 2, 3 … in the shape of the values. */
function counted(like: EngineMatrix): EngineMatrix {
  let count = 0;
  return like.map((column) => column.map(() => ({ value: ++count })));
}

function numeric(name: string, cell: EngineValue): number {
  if (isEngineError(cell)) return numberOf(cell);
  return typeof cell.value === "number" ? cell.value : fail(`${name} needs a number in every cell.`, "#VALUE!");
}

function given(argument: EngineArgument): boolean {
  return argument !== undefined && (Array.isArray(argument) || argument.value !== null);
}

function matrixOf(argument: EngineArgument): EngineMatrix {
  return Array.isArray(argument) ? argument : [[argument ?? { value: null }]];
}
