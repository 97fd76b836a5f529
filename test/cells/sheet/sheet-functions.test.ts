import fc from "fast-check";
import { columnOf } from "../../../src/cells/sheet/column-of";
import { limitsOf } from "../../../src/cells/sheet/limits-of";
import { notesOf } from "../../../src/cells/sheet/notes-of";
import { sourceOf } from "../../../src/cells/sheet/source-of";
import { catalogue } from "../../../src/cells/generated/catalogue";

const none = {} as CustomFunctions.Invocation;
const table = [
  ["station x", "momentum loss θ", "note"],
  [0, "", "stagnation start"],
  [0.5, 0.001, ""],
];

test("COLUMN_OF finds a column by key, heading or symbol, in any case", () => {
  for (const heading of ["momentum_loss", "Momentum loss θ", "θ"]) expect(columnOf(table, heading, none)).toEqual([[""], [0.001]]);
});

test("COLUMN_OF finds a heading of the user's own", () => {
  expect(columnOf([["my tap", "cp"], [1, -0.5]], "CP", none)).toEqual([[-0.5]]);
});

test.each<[unknown, unknown, string, string]>([
  [table, "shape", "#N/A", 'COLUMN_OF needs a heading of the table; "shape" is none of them, nearest is "'],
  [table, null, "#VALUE!", "COLUMN_OF needs heading; it is missing or blank"],
  [table, 3, "#VALUE!", "COLUMN_OF needs text for heading; it has 3"],
  [[["a"]], "a", "#VALUE!", "COLUMN_OF needs a table with a heading row and at least one row below it"],
  [[[1, 2], [3, 4]], "a", "#VALUE!", "COLUMN_OF needs headings in the table's first row; it holds none"],
  [[["a"], [{ code: "#NUM!" }]], "a", "#VALUE!", "COLUMN_OF needs a table without errors; the column holds #NUM!"],
  [null, "a", "#VALUE!", "COLUMN_OF needs a table with a heading row"],
])("COLUMN_OF(%j, %j) gives %s with a sentence", (range, heading, code, sentence) => {
  const run = () => columnOf(range as never, heading, none);
  expect(run).toThrow(sentence);
  expect(run).toThrow(expect.objectContaining({ code }));
});

test("NOTES_OF collects notes with their stations", () => {
  expect(notesOf(table, none)).toEqual([["at 0: stagnation start"]]);
  expect(notesOf([["station x", "note"], [1, ""]], none)).toEqual([["no notes"]]);
  expect(() => notesOf([["station x"], [1]], none)).toThrow("NOTES_OF needs a table with a note column; this one has none");
});

test("SOURCE_OF and LIMITS_OF speak for every function, with or without WALL.", () => {
  for (const entry of catalogue) {
    expect(sourceOf(`WALL.${entry.name}`, none).flat()).toEqual(entry.sources);
    expect(limitsOf(entry.name.toLowerCase(), none).flat()).toEqual(entry.limits);
  }
});

test("an unknown name is refused with the nearest one", () => {
  expect(() => sourceOf("COLUM_OF", none)).toThrow('SOURCE_OF needs the name of a WALL function; "COLUM_OF" is none, nearest is COLUMN_OF');
});

test("whatever the cells hold, COLUMN_OF gives plain cells or a sentence", () => {
  const cell = fc.oneof(fc.double(), fc.string(), fc.boolean(), fc.constantFrom(null, undefined, "", { code: "#N/A" }, {}));
  fc.assert(
    fc.property(fc.array(fc.array(cell, { maxLength: 3 }), { maxLength: 4 }), cell, (rows, heading) => {
      try {
        for (const [value] of columnOf(rows as never, heading, none)) expect(typeof value === "number" ? Number.isFinite(value) : typeof value).toBeTruthy();
      } catch (error) {
        expect((error as Error).message).toMatch(/^COLUMN_OF needs /);
      }
    }),
  );
});
