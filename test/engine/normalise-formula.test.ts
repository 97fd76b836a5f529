import fc from "fast-check";
import { excelText } from "../../src/engine/excel-text";
import { makeNormaliser } from "../../src/engine/normalise-formula";

const normalise = makeNormaliser(["WALL.THWAITES_MARCH", "WALL.COLUMN_OF"]);

describe("normalising formula text", () => {
  it.each([
    ["=LOG10(A1)", "=LOG.10(A1)"],
    ["=log10 (A1)", "=LOG.10 (A1)"],
    ['=LOG10&"LOG10("', '=LOG10&"LOG10("'],
    ["='LOG10(x)'!A1+1", "='LOG10(x)'!A1+1"],
    ['="a""b"', '=("a"&CHAR(34)&"b")'],
    ['="x"', '="x"'],
    ['="C:\\"', '=("C:"&CHAR(92)&"")'],
    ["=_xldudf_WALL_THWAITES_MARCH(A1:A9,B1:B9,C1)", "=WALL.THWAITES_MARCH(A1:A9,B1:B9,C1)"],
    ["=_xldudf_wall_column_of(_xlfn.ANCHORARRAY(D5),\"θ\")", '=WALL.COLUMN_OF(D5#,"θ")'],
    ["=_xldudf_OTHER_THING(1)", "=_xldudf_OTHER_THING(1)"],
    ["=_xlfn.LET(_xlpm.a,1,_xlpm.a+1)", "=LET(a,1,a+1)"],
    ["=_xlfn._xlws.SORT(A1:A3)", "=SORT(A1:A3)"],
    ["=_xlfn.MAP(A1:A3,_xleta.SQRT)", "=MAP(A1:A3,SQRT)"],
    ["=SUM(_xlfn.ANCHORARRAY('My sheet'!$D$5))", "=SUM('My sheet'!$D$5#)"],
    ["=_xlfn.SINGLE(A1:A3)", "=SINGLE(A1:A3)"],
    ["=@A1:A3+1", "=SINGLE(A1:A3)+1"],
    ["=@A1+1", "=A1+1"],
    ["=SUM(@name,@f(x,y))", "=SUM(SINGLE(name),SINGLE(f(x,y)))"],
    ["=IFERROR(#N/A,#DIV/0!)", '=IFERROR(ERROR.CONSTANT("#N/A"),ERROR.CONSTANT("#DIV/0!"))'],
    ["=Sheet1!#REF!+#REF!", "=#REF+#REF"],
    ["='My sheet'!#REF!", "=#REF"],
    ["=A1#+1", "=A1#+1"],
    ["=LAMBDA(x,x+1)(2)", "=CALL.LAMBDA(LAMBDA(x,x+1),2)"],
    ["=f(1)(2)(3)", "=CALL.LAMBDA(CALL.LAMBDA(f(1),2),3)"],
    ["=Table1[col]+Table1[[#This Row],[a'[b]]", "=Table1[col]+Table1[[#This Row],[a'[b]]"],
  ])("reads %s as %s", (typed, engine) => {
    expect(normalise(typed)).toBe(engine);
    expect(normalise(engine)).toBe(engine);
  });

  it.each([
    '=LOG10(A1)&"a""b"',
    '="""" & "C:\\"',
    "=@A1:A3",
    "=@f(1,2)+1",
    "=LAMBDA(x, x+1)(2)",
    "=f(1)(2)",
    "=IFERROR(#N/A, #VALUE!)",
    "=-(A1^2) + #REF!",
    "=CHAR(34)&CHAR(10)",
    '=("a"&CHAR(10)&"b")',
  ])("gives %s back as it was typed", (typed) => {
    expect(excelText(normalise(typed))).toBe(typed);
  });

  it("keeps any text inside strings and quoted sheet names, and is its own fixed point", () => {
    const text = fc.string({ unit: fc.constantFrom(..."ab\"\\'@#(LOG10),_xlfn.%") });
    fc.assert(
      fc.property(text, text, (inside, sheet) => {
        const typed = `="${inside.replace(/"/g, '""')}"&'${sheet.replace(/'/g, "''")}x'!A1`;
        const engine = normalise(typed);
        expect(excelText(engine)).toBe(typed);
        expect(normalise(engine)).toBe(engine);
      }),
    );
  });

  it("loses no character of text it has nothing to do for", () => {
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom(..."A1B2+-*/^&=<>(), {};:%$.!x") }), (body) => {
        fc.pre(!/LOG10/i.test(body) && !/\)\s*\(/.test(body));
        expect(normalise(`=${body}`)).toBe(`=${body}`);
      }),
    );
  });
});
