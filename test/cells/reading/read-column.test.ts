import fc from "fast-check";
import { openCall } from "../../../src/cells/reading/call";
import { readColumn, readOptionalColumn } from "../../../src/cells/reading/read-column";

const call = openCall("THWAITES_MARCH", { parameterAddresses: ["Wing!A5:A11", "Wing!B5:H5"] });
const column = (...cells: unknown[]) => cells.map((c) => [c]);

test("a column, a row and a single cell are read alike", () => {
  expect([...readColumn(call, "x", column(1, 2, 3))]).toEqual([1, 2, 3]);
  expect([...readColumn(call, "x", [[1, 2, 3]])]).toEqual([1, 2, 3]);
  expect([...readColumn(call, "x", 4)]).toEqual([4]);
  expect([...readColumn(call, "x", [1, 2])]).toEqual([1, 2]);
});

test("trailing blanks of every host's kind are dropped", () => {
  expect([...readColumn(call, "x", column(1, 2, null, "", undefined, "  "))]).toEqual([1, 2]);
  expect([...readColumn(call, "x", column(1, 2, 0, 0), { rising: true })]).toEqual([1, 2]); // desktop hosts send 0 for a blank
  expect([...readColumn(call, "x", column(-2, -1, 0), { rising: true })]).toEqual([-2, -1, 0]);
  expect([...readColumn(call, "x", column(-2, -1, 0, 0), { rising: true })]).toEqual([-2, -1, 0]);
  expect([...readColumn(call, "ue", column(3, 4, 0, null), { length: 2 })]).toEqual([3, 4]);
});

test("a rich cell is read by its basic value", () => {
  expect([...readColumn(call, "x", column({ basicValue: 2.5 }))]).toEqual([2.5]);
});

test.each<[string, unknown, object, string]>([
  ["a blank inside", column(1, null, 3), {}, "THWAITES_MARCH needs numbers in x; row 2 (A6) is blank"],
  ["text inside", column(1, "0,35", 3), {}, 'THWAITES_MARCH needs numbers in x; row 2 (A6) holds the text "0,35"'],
  ["a heading in the range", column("x [m]", 1, 3), {}, 'THWAITES_MARCH needs numbers in x; row 1 (A5) holds the text "x [m]"; begin the range below its heading'],
  ["an error cell", column(1, { code: "#DIV/0!" }), {}, "THWAITES_MARCH needs numbers in x; row 2 (A6) holds #DIV/0!"],
  ["TRUE", column(1, true), {}, "THWAITES_MARCH needs numbers in x; row 2 (A6) holds TRUE"],
  ["infinity", column(1, Infinity), {}, "THWAITES_MARCH needs numbers in x; row 2 (A6) holds no finite number"],
  ["NaN", column(1, NaN, 2), {}, "THWAITES_MARCH needs numbers in x; row 2 (A6) holds no finite number"],
  ["a repeated station", column(0, 0.35, 0.35), { rising: true }, "THWAITES_MARCH needs rising x; row 3 (A7) repeats 0.35"],
  ["a falling station", column(0, 0.35, 0.3), { rising: true }, "THWAITES_MARCH needs rising x; row 3 (A7) falls to 0.3 after 0.35"],
  ["a block", [[1, 2], [3, 4]], {}, "THWAITES_MARCH needs x as one column or one row; the range is 2 rows by 2 columns"],
  ["nothing", null, {}, "THWAITES_MARCH needs x; it is missing"],
  ["only blanks", column(null, ""), {}, "THWAITES_MARCH needs at least 1 number in x; 0 given"],
  ["a short column", column(1, 2), { least: 3 }, "THWAITES_MARCH needs at least 3 numbers in x; 2 given"],
  ["fewer rows than expected", column(1, 2), { length: 3 }, "THWAITES_MARCH needs columns of equal length; x has 2 rows where 3 are expected"],
  ["more rows than expected", column(1, 2, 3, 4), { length: 3 }, "THWAITES_MARCH needs columns of equal length; x has 4 rows where 3 are expected"],
  ["zero where it must be positive", column(1, 0, 2), { positive: true }, "THWAITES_MARCH needs x above 0; row 2 (A6) has 0 or is blank"],
  ["a negative value", column(1, -2), { notNegative: true }, "THWAITES_MARCH needs x of 0 or more; row 2 (A6) has -2"],
])("%s is refused in one sentence that names the place", (_what, raw, rules, sentence) => {
  expect(() => readColumn(call, "x", raw, rules)).toThrow(sentence);
});

test("an entry of a row is placed along the row", () => {
  expect(() => readColumn(call, "ue", [[1, "a", 3]])).toThrow('row 2 (C5) holds the text "a"');
});

test("without addresses the row alone is named", () => {
  expect(() => readColumn(openCall("THWAITES_MARCH"), "x", column(1, "a"))).toThrow(/row 2 holds the text "a"$/);
});

test("an omitted or all-blank optional column is undefined", () => {
  for (const raw of [undefined, null, "", [[null], [""]]]) expect(readOptionalColumn(call, "radius", raw)).toBeUndefined();
});

test("a million rows are read", () => {
  const rows = Array.from({ length: 1_000_000 }, (_, i) => [i + 1]);
  expect(readColumn(call, "x", rows, { rising: true }).length).toBe(1_000_000);
});

test("whatever the cells hold, the reader gives finite numbers or a sentence", () => {
  const cell = fc.oneof(fc.double(), fc.string(), fc.boolean(), fc.constantFrom(null, undefined, "", { code: "#N/A" }, { basicValue: 1 }, {}));
  fc.assert(
    fc.property(fc.array(fc.array(cell, { maxLength: 3 }), { maxLength: 6 }), (rows) => {
      try {
        expect([...readColumn(call, "x", rows, { rising: true })].every(Number.isFinite)).toBe(true);
      } catch (error) {
        expect((error as Error).name).toBe("CellError");
        expect((error as Error).message).toMatch(/^THWAITES_MARCH needs /);
      }
    }),
  );
});
