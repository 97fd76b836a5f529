/** Dates before 1 March 1900: Excel counts a 29 February 1900 that never was, the engine (19.3.7) does not. Later dates agree. */
import type { EngineLibrary } from "../types";
import { isEngineError } from "../engine-values";
import { correct, numberOf } from "./define";

/** Excel's number of the day that never was. */
const NEVER = 60;
const DAYS_OF_JANUARY = 31;

export function installOldDates(library: EngineLibrary): void {
  const old = (name: string, of: (day: number) => number) =>
    correct(library, name, (given, [date]) => {
      const value = date === undefined || Array.isArray(date) ? undefined : date.value;
      const day = value === null ? 0 : typeof value === "number" ? Math.floor(value) : -1;
      return isEngineError(given as never) || day < 0 || day > NEVER ? undefined : of(day);
    });
  old("YEAR", () => 1900);
  old("MONTH", (day) => (day <= DAYS_OF_JANUARY ? 1 : 2));
  old("DAY", (day) => (day <= DAYS_OF_JANUARY ? day : day - DAYS_OF_JANUARY));
  correct(library, "DATE", (given, args) => {
    const value = isEngineError(given as never) || Array.isArray(given) ? undefined : (given as { value: unknown }).value;
    if (typeof value !== "number" || value > NEVER + 1) return undefined;
    const [, month, day] = args.map((arg) => Math.trunc(numberOf(arg)));
    const isNever = value === NEVER + 1 && month === 2 && day === 29;
    return value <= NEVER || isNever ? { ...(given as { value: number }), value: value - 1 } : undefined;
  });
}
