/** Statistics Excel has and the engine (19.3.7) lacks; the distributions made from the incomplete gamma and beta functions stand in distributions.ts. */
import * as formulajs from "@formulajs/formulajs";
import type { EngineArgument, EngineLibrary } from "../types";
import { addMissing, numberOf, numbersOf } from "./define";
import { asNumber, fail } from "./elementary";
import { normalDensity, normalProbability, normalQuantile } from "./error-function";
import { studentTwoTails, studentTwoTailsQuantile } from "./student";

export function installStatistics(library: EngineLibrary): void {
  const pooled = (name: string, description: string, least: number, f: (numbers: number[]) => number) =>
    addMissing(library, name, description, ["number (any, range, repeating)"], (...args) => {
      const numbers = numbersOf(args);
      return numbers.length < least ? fail(`${name} needs at least ${least} number${least === 1 ? "" : "s"}.`, least > 1 ? "#DIV/0!" : "#NUM!") : f(numbers);
    });
  const numbers = (names: readonly string[], description: string, args: string, f: (...n: number[]) => number) => {
    const definitions = args.split(" ").map((arg) => (arg.endsWith("?") ? `${arg.slice(0, -1)} (number, optional)` : `${arg} (number)`));
    for (const name of names) addMissing(library, name, description, definitions, (...given: EngineArgument[]) => f(...given.map((x) => numberOf(x))));
  };

  pooled("DEVSQ", "Sum of squared deviations from the mean.", 1, (x) => asNumber(formulajs.DEVSQ(...x)));
  pooled("GEOMEAN", "Geometric mean.", 1, (x) => (x.some((v) => v <= 0) ? fail("GEOMEAN needs numbers above 0.") : Math.exp(mean(x.map(Math.log)))));
  pooled("HARMEAN", "Harmonic mean.", 1, (x) => (x.some((v) => v <= 0) ? fail("HARMEAN needs numbers above 0.") : 1 / mean(x.map((v) => 1 / v))));
  pooled("SKEW", "Skewness of a sample.", 3, (x) => asNumber(formulajs.SKEW(...x)));
  pooled("SKEW.P", "Skewness of a whole population.", 3, (x) => {
    const m = mean(x);
    const spread = mean(x.map((v) => (v - m) ** 2));
    return spread === 0 ? fail("SKEW.P needs numbers that differ.", "#DIV/0!") : mean(x.map((v) => (v - m) ** 3)) / spread ** 1.5;
  });
  pooled("KURT", "Excess kurtosis of a sample.", 4, (x) => asNumber(formulajs.KURT(...x)));
  pooled("MODE.SNGL", "Most frequent number.", 1, mode);
  pooled("MODE", "Most frequent number.", 1, mode);
  addMissing(library, "TRIMMEAN", "Mean without the outer share of the numbers.", ["array (any, range)", "share (number)"], (array, share) => trimmedMean(numbersOf([array]), numberOf(share)));
  addMissing(library, "RANK.EQ", "Rank of a number in a list; equal numbers share the best rank.", ["number (number)", "list (any, range)", "ascending (number, optional)"], (x, list, order) => rank(x, list, order).best);
  addMissing(library, "RANK.AVG", "Rank of a number in a list; equal numbers share the mean rank.", ["number (number)", "list (any, range)", "ascending (number, optional)"], (x, list, order) => {
    const { best, equal } = rank(x, list, order);
    return best + (equal - 1) / 2;
  });
  for (const name of ["PERCENTRANK", "PERCENTRANK.INC"]) {
    addMissing(library, name, "Share of a list below a number, ends included.", ["list (any, range)", "number (number)", "digits (number, optional)"], (list, x, digits) => percentRank(numbersOf([list]), numberOf(x), numberOf(digits, 3), 0));
  }
  addMissing(library, "PERCENTRANK.EXC", "Share of a list below a number, ends excluded.", ["list (any, range)", "number (number)", "digits (number, optional)"], (list, x, digits) => percentRank(numbersOf([list]), numberOf(x), numberOf(digits, 3), 1));

  numbers(["STANDARDIZE"], "Distance from the mean in standard deviations.", "x mean standard_deviation", (x, m, s) => (x - m) / positive("STANDARDIZE", s));
  numbers(["NORM.DIST", "NORMDIST"], "Normal distribution.", "x mean standard_deviation cumulative", (x, m, s, cumulative) => {
    const z = (x - m) / positive("NORM.DIST", s);
    return cumulative ? normalProbability(z) : normalDensity(z) / s;
  });
  numbers(["NORM.S.DIST"], "Standard normal distribution.", "z cumulative", (z, cumulative) => (cumulative ? normalProbability(z) : normalDensity(z)));
  numbers(["NORMSDIST"], "Standard normal distribution.", "z", normalProbability);
  numbers(["NORM.INV", "NORMINV"], "Number below which a share of a normal distribution lies.", "probability mean standard_deviation", (p, m, s) => m + positive("NORM.INV", s) * normalQuantile(share("NORM.INV", p)));
  numbers(["NORM.S.INV", "NORMSINV"], "Number below which a share of the standard normal distribution lies.", "probability", (p) => normalQuantile(share("NORM.S.INV", p)));
  numbers(["CONFIDENCE.NORM", "CONFIDENCE"], "Half width of a confidence interval, standard deviation known.", "alpha standard_deviation size", (a, s, n) => (positive("CONFIDENCE.NORM", s) * normalQuantile(1 - share("CONFIDENCE.NORM", a) / 2)) / Math.sqrt(n));
  numbers(["CONFIDENCE.T"], "Half width of a confidence interval by Student's t.", "alpha standard_deviation size", (a, s, n) => (positive("CONFIDENCE.T", s) * studentTwoTailsQuantile(share("CONFIDENCE.T", a), atLeastOne(n - 1))) / Math.sqrt(n));
  numbers(["T.DIST.2T"], "Both tails of Student's t distribution.", "x degrees", (x, n) => (x < 0 ? fail("T.DIST.2T needs x of at least 0.") : studentTwoTails(x, atLeastOne(n))));
  numbers(["T.DIST.RT"], "Right tail of Student's t distribution.", "x degrees", (x, n) => (x < 0 ? 1 - studentTwoTails(-x, atLeastOne(n)) / 2 : studentTwoTails(x, atLeastOne(n)) / 2));
  numbers(["T.INV.2T", "TINV"], "Number outside which a share of Student's t distribution lies.", "probability degrees", (p, n) => studentTwoTailsQuantile(share("T.INV.2T", p), atLeastOne(n)));
  numbers(["T.INV"], "Number below which a share of Student's t distribution lies.", "probability degrees", (p, n) =>
    p === 0.5 ? 0 : Math.sign(p - 0.5) * studentTwoTailsQuantile(2 * Math.min(share("T.INV", p), 1 - p), atLeastOne(n)),
  );
  numbers(["EXPON.DIST", "EXPONDIST"], "Exponential distribution.", "x lambda cumulative", (x, l, c) => (x < 0 ? fail("EXPON.DIST needs x of at least 0.") : c ? -Math.expm1(-positive("EXPON.DIST", l) * x) : l * Math.exp(-l * x)));
  numbers(["FISHER"], "Fisher transformation.", "x", (x) => (Math.abs(x) < 1 ? Math.atanh(x) : fail("FISHER needs a number between -1 and 1.")));
  numbers(["FISHERINV"], "Inverse of the Fisher transformation.", "y", Math.tanh);
  addMissing(library, "FORECAST.LINEAR", "Value at x on the straight line through known points.", ["x (number)", "known_y (any, range)", "known_x (any, range)"], (x, ys, xs) => straightLine(numberOf(x), numbersOf([ys]), numbersOf([xs])));
}

function atLeastOne(degrees: number): number {
  return degrees >= 1 ? Math.trunc(degrees) : fail("At least 1 degree of freedom is needed.");
}

function mean(x: readonly number[]): number {
  return x.reduce((sum, v) => sum + v, 0) / x.length;
}

function mode(x: number[]): number {
  const counts = new Map<number, number>();
  for (const v of x) counts.set(v, (counts.get(v) ?? 0) + 1);
  const [value, count] = [...counts].reduce((best, entry) => (entry[1] > best[1] ? entry : best));
  return count > 1 ? value : fail("No number occurs twice.", "#N/A");
}

function trimmedMean(x: number[], cut: number): number {
  if (!(cut >= 0 && cut < 1) || x.length === 0) fail("TRIMMEAN needs numbers and a share from 0 up to 1.");
  const each = Math.floor((x.length * cut) / 2);
  return mean(x.sort((a, b) => a - b).slice(each, x.length - each));
}

function rank(x: EngineArgument, list: EngineArgument, order: EngineArgument): { best: number; equal: number } {
  const value = numberOf(x);
  const ascending = numberOf(order) !== 0;
  const numbers = numbersOf([list]);
  const equal = numbers.filter((v) => v === value).length;
  if (equal === 0) fail("The number is not in the list.", "#N/A");
  return { best: 1 + numbers.filter((v) => (ascending ? v < value : v > value)).length, equal };
}

function percentRank(list: number[], x: number, digits: number, outside: 0 | 1): number {
  const sorted = list.sort((a, b) => a - b);
  if (sorted.length === 0 || x < sorted[0]! || x > sorted.at(-1)!) fail("The number lies outside the list.", "#N/A");
  const below = sorted.filter((v) => v < x).length;
  const between = sorted[below] === x ? 0 : (x - sorted[below - 1]!) / (sorted[below]! - sorted[below - 1]!) - 1;
  const share = sorted.length === 1 && outside === 0 ? 1 : (below + between + outside) / (sorted.length - 1 + 2 * outside);
  return Math.floor(Number((share * 10 ** digits).toPrecision(15))) / 10 ** digits;
}

function straightLine(x: number, ys: number[], xs: number[]): number {
  if (ys.length !== xs.length || xs.length === 0) fail("FORECAST.LINEAR needs two lists of one length.", "#N/A");
  const [mx, my] = [mean(xs), mean(ys)];
  const spread = xs.reduce((sum, v) => sum + (v - mx) ** 2, 0);
  if (spread === 0) fail("FORECAST.LINEAR needs different x values.", "#DIV/0!");
  return my + ((x - mx) * xs.reduce((sum, v, i) => sum + (v - mx) * (ys[i]! - my), 0)) / spread;
}

function positive(name: string, s: number): number {
  return s > 0 ? s : fail(`${name} needs a number above 0.`);
}

function share(name: string, p: number): number {
  return p > 0 && p < 1 ? p : fail(`${name} needs a probability between 0 and 1.`);
}
