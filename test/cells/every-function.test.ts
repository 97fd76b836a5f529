import fc from "fast-check";
import { catalogue } from "../../src/cells/generated/catalogue";
import { wallFunctions } from "../../src/cells/generated/functions";

/** Calls tried on each function; the same ones each time. */
const RUNS = { numRuns: 250, seed: 20_261_201 };

/** Well-formed columns share one length, so that a good share of the calls gets past the readers. */
const ROWS = 8;

const number = fc.oneof(
  { weight: 6, arbitrary: fc.double({ min: -10, max: 10, noNaN: true }) },
  { weight: 1, arbitrary: fc.constantFrom(0, -0, 1e-308, 5e-324, 1e308, -1e308, Infinity, NaN) },
);
const cell = fc.oneof(
  { weight: 8, arbitrary: number },
  { weight: 1, arbitrary: fc.constantFrom<unknown>(null, undefined, "", " ", "0,35", "٣", "=1+1", true, false, { code: "#DIV/0!" }, { basicValue: 2 }, {}, []) },
);
/** Ranges as users select them: a rising column, a column of anything, a row, a ragged block, one cell, nothing. */
const rising = fc.array(fc.double({ min: 1e-3, max: 2, noNaN: true }), { minLength: ROWS, maxLength: ROWS }).map((steps) => {
  let sum = 0;
  return steps.map((step) => [(sum += step) - steps[0]!]);
});
const plain = fc.array(fc.double({ min: 0.1, max: 10, noNaN: true }), { minLength: ROWS, maxLength: ROWS }).map((v) => v.map((x) => [x]));
const range = fc.oneof(
  { weight: 4, arbitrary: rising },
  { weight: 4, arbitrary: plain },
  { weight: 2, arbitrary: fc.array(cell, { maxLength: 8 }).map((v) => v.map((x) => [x])) },
  { weight: 1, arbitrary: fc.array(cell, { maxLength: 8 }).map((v) => [v]) },
  { weight: 1, arbitrary: fc.array(fc.array(cell, { maxLength: 3 }), { maxLength: 4 }) },
  { weight: 2, arbitrary: cell },
);
const words = fc.constantFrom("upper", "found", "H12", "monotone", "edge fit = smooth", "columns = station", "near wall = none", "no such word", "θ", "WALL.COLUMN_OF", "a = b; c");
const argument = fc.oneof({ weight: 6, arbitrary: range }, { weight: 1, arbitrary: words });

describe.each(catalogue.map((entry) => [entry.name, entry] as const))("%s, whatever it is given", (name, entry) => {
  const call = (args: readonly unknown[]) => {
    try {
      return { result: wallFunctions[name]!(...args, { parameterAddresses: [] }) };
    } catch (error) {
      return { error: error as Error & { code?: string } };
    }
  };

  test("gives plain finite cells or an error with a sentence, the same each time, and changes no input", () => {
    const values = fc.tuple(...entry.parameters.map((p) => (p.optional ? fc.option(argument) : argument)));
    fc.assert(
      fc.property(values, (args) => {
        const before = JSON.stringify(args);
        const once = call(args);
        expect(JSON.stringify(args)).toBe(before);
        if (once.error) {
          expect([once.error.name, once.error.message]).toEqual(["CellError", once.error.message]);
          expect(["#VALUE!", "#N/A"]).toContain(once.error.code);
          expect(once.error.message).toMatch(new RegExp(`^${name} needs [^]+;[^]+`));
          expect(once.error.message).not.toMatch(/undefined|NaN|\[object/);
        } else {
          const rows = Array.isArray(once.result) ? (once.result as unknown[][]) : [[once.result]];
          const width = rows[0]!.length;
          for (const row of rows) {
            expect(row).toHaveLength(width);
            for (const v of row) if (!(typeof v === "string" || typeof v === "boolean" || Number.isFinite(v))) throw new Error(`${name} spilled ${String(v)}`);
          }
        }
        expect(call(args)).toEqual(once);
      }),
      RUNS,
    );
  });

  test("called with nothing says what it needs", () => {
    const { error } = call(entry.parameters.map(() => null));
    if (name !== "INPUT_CHECK") expect(error?.message).toMatch(new RegExp(`^${name} needs `)); // INPUT_CHECK spills the sentence
  });
});
