import fc from "fast-check";
import { formulaReader, sharedFormulaAt } from "../../src/workbook/plain-formula";
import { shownSpelling, storedSpelling } from "../../src/workbook/stored-spelling";

const OWN = ["WALL.THWAITES_MARCH", "WALL.COLUMN_OF"];
const table = { name: "Runs", sheet: "Data", ref: "B2:D6", hasHeadings: true, hasTotals: true, columns: ["run", "speed ue", "cp"] };
const names = [
  { name: "nu_air", sheet: undefined, text: "Air!$B$1" },
  { name: "twice", sheet: undefined, text: "2*nu_air" },
  { name: "start", sheet: "Wing", text: "0.5" },
  { name: "beside", sheet: undefined, text: "Wing!B1" },
  { name: "circle", sheet: undefined, text: "circle+1" },
  { name: "square", sheet: undefined, text: "_xlfn.LAMBDA(_xlpm.x,_xlpm.x^2)" },
  { name: "factorial", sheet: undefined, text: "_xlfn.LAMBDA(_xlpm.n,IF(_xlpm.n<2,1,_xlpm.n*factorial(_xlpm.n-1)))" },
  { name: "RATE", sheet: undefined, text: "Air!$B$2" },
  ...Array.from({ length: 30 }, (_, i) => ({ name: `laugh${i}`, sheet: undefined, text: `laugh${i + 1}+laugh${i + 1}` })),
  { name: "laugh30", sheet: undefined, text: "1" },
];
const read = formulaReader({ names, tables: [table] }, (name) => (name === "It's" ? "It’s" : name));
const plain = (text: string, sheet = "Wing", column = 3, row = 4) => read(text, sheet, { column, row }).text;

test.each([
  ["SUM(A1:A3)*2", "=SUM(A1:A3)*2"],
  ["twice+1", "=(2*Air!$B$1)+1"],
  ["start*nu_air", "=(0.5)*Air!$B$1"],
  ["beside", "=Wing!D4"], // a relative name, seen from C4
  ["_xlfn.LET(_xlpm.nu_air,1,_xlpm.nu_air)", "=_xlfn.LET(_xlpm.nu_air,1,_xlpm.nu_air)"],
  ['"nu_air"&nu_air', '="nu_air"&Air!$B$1'],
  ["SUM(Runs[speed ue])", "=SUM('Data'!$C$3:$C$5)"],
  ["ROWS(Runs[#All])+Runs[[#Totals],[cp]]", "=ROWS('Data'!$B$2:$D$6)+'Data'!$D$6"],
  ["SUM(Runs[[run]:[speed ue]])", "=SUM('Data'!$B$3:$C$5)"],
  ["Runs[none]", "=#REF!"],
  ["'It''s'!A1", "='It’s'!A1"],
  ["SUM(Runs)", "=SUM('Data'!$B$3:$D$5)"], // the table's bare name, as other writers store it
  ["square(3)+RATE(48,-200,8000)+RATE", "=(_xlfn.LAMBDA(_xlpm.x,_xlpm.x^2))(3)+RATE(48,-200,8000)+Air!$B$2"],
  ["[0]!twice&\"[0]!\"", "=(2*Air!$B$1)&\"[0]!\""],
  ["#REF!A1+1", "=#REF!+1"],
  ["'Übersicht 風'!$A$1+'O''Brien'!B2", "='Übersicht 風'!$A$1+'O''Brien'!B2"],
  // Add-in calls as older files and other writers spell them.
  ["_xll.WALL.COLUMN_OF(A1,B1)", "=WALL.COLUMN_OF(A1,B1)"],
  ["_xludf.WALL.COLUMN_OF(A1,B1)", "=WALL.COLUMN_OF(A1,B1)"],
  ["_xlfn._xldudf_wall_column_of(A1,B1)", "=_xldudf_wall_column_of(A1,B1)"],
  ["WALL_COLUMN_OF(A1,B1)", "=_xldudf_WALL_COLUMN_OF(A1,B1)"],
  ["[3]!_xll.WALL.COLUMN_OF(A1,B1)", "=WALL.COLUMN_OF(A1,B1)"],
  ["_xlfn._xludf.XLOOKUP(1,A1,B1)", "=XLOOKUP(1,A1,B1)"],
  ["[1]!WALL.COLUMN_OF(A1,B1)", "=WALL.COLUMN_OF(A1,B1)"],
  ["'C:\\old\\[add.xlam]'!_xldudf_WALL_COLUMN_OF(A1,B1)", "=_xldudf_WALL_COLUMN_OF(A1,B1)"],
])("the stored %s is read as %s", (stored, expected) => {
  expect(plain(stored)).toBe(expected);
});

test("the row of a table is the formula's own", () => {
  expect(plain("Runs[[#This Row],[cp]]*2", "Data", 6, 4)).toBe("='Data'!$D$4*2");
});

test("the row of a table has no value beside its rows, and a part it lacks no reference", () => {
  expect(plain("Runs[[#This Row],[cp]]", "Data", 6, 9)).toBe("=#VALUE!");
  const bare = formulaReader({ names: [], tables: [{ ...table, hasHeadings: false, hasTotals: false }] });
  expect(["Runs[[#Headers],[cp]]", "Runs[[#Totals],[cp]]", "Runs[cp]"].map((text) => bare(text, "Data", { column: 6, row: 4 }).text)).toEqual(["=#REF!", "=#REF!", "='Data'!$D$2:$D$6"]);
});

test("names made to exhaust the reader, and a LAMBDA that calls itself, are told and not unfolded", () => {
  const at = { column: 1, row: 1 };
  expect(read("laugh0", "Wing", at).missingName).toMatch(/^laugh/);
  expect(read("factorial(5)", "Wing", at).missingName).toBe("factorial");
});

test("a name of another book is a link to it, though this book has a name like it", () => {
  expect(read("[1]!twice", "Wing", { column: 1, row: 1 }).outside).toBe(true);
});

test("a name that refers to itself ends in #NAME? and not in a hang", () => {
  expect(plain("circle")).toContain("#NAME?");
});

test("the functions a formula calls and links to other books are told", () => {
  expect(read("CUBEVALUE(1)+_xlfn.XLOOKUP(1,A1,B1)+_xldudf_WALL_COLUMN_OF(A1,B1)", "Wing", { column: 1, row: 1 }).functions).toEqual(["CUBEVALUE", "XLOOKUP", "_XLDUDF_WALL_COLUMN_OF"]);
  expect(read("'[2]Other'!A1", "Wing", { column: 1, row: 1 }).outside).toBe(true);
});

test("a shared formula moves with its cell", () => {
  expect(sharedFormulaAt("A1+$B$1+C$2", "D1", "E3")).toBe("B3+$B$1+D$2");
});

test.each([
  ["=LET(a,1,f,LAMBDA(x,x+a),f(2)+XLOOKUP(1,A1:A3,B1:B3))", "_xlfn.LET(_xlpm.a,1,_xlpm.f,_xlfn.LAMBDA(_xlpm.x,_xlpm.x+_xlpm.a),_xlpm.f(2)+_xlfn.XLOOKUP(1,A1:A3,B1:B3))"],
  ["=WALL.COLUMN_OF(Wing!D5#,\"θ\")", "_xldudf_WALL_COLUMN_OF(_xlfn.ANCHORARRAY(Wing!D5),\"θ\")"],
  ["=SORT(FILTER(A1:A3,B1:B3>0))", "_xlfn._xlws.SORT(_xlfn._xlws.FILTER(A1:A3,B1:B3>0))"],
  ['=IF(A1="LET(a,1)",-2^2,SUM(B1:B9))', 'IF(A1="LET(a,1)",-2^2,SUM(B1:B9))'],
])("%s is stored as %s and shown again as it was", (shown, stored) => {
  expect(storedSpelling(shown, OWN)).toBe(stored);
  expect(shownSpelling(stored, OWN)).toBe(shown);
});

test("any formula: stored and shown again is the identity", () => {
  const leaf = fc.constantFrom("A1", "$B$2:C9", "D5#", "'It''s'!E1", "1.5", '"a""b"', "TRUE", "x");
  const { formula } = fc.letrec<{ formula: string; call: string; binary: string; let: string }>((tie) => ({
    formula: fc.oneof({ maxDepth: 4 }, leaf, tie("call"), tie("binary"), tie("let")),
    call: fc.tuple(fc.constantFrom("SUM", "XLOOKUP", "FILTER", "WALL.THWAITES_MARCH", "NORM.DIST", "-"), fc.array(tie("formula"), { minLength: 1, maxLength: 3 })).map(([f, a]) => (f === "-" ? `-${a[0]}` : `${f}(${a.join(",")})`)),
    binary: fc.tuple(tie("formula"), fc.constantFrom("+", "*", "^", "&", "<="), tie("formula")).map((p) => p.join("")),
    let: fc.tuple(tie("formula"), tie("formula")).map(([a, b]) => `LET(x,${a},${b}+x)`),
  }));
  fc.assert(fc.property(formula, (f) => expect(shownSpelling(storedSpelling("=" + f, OWN), OWN)).toBe("=" + f)), { numRuns: 500 });
});
