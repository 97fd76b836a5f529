import fc from "fast-check";
import { shownSpelling, storedSpelling } from "../../src/workbook/stored-spelling";

const NAMES = ["WALL.THWAITES_MARCH", "WALL.COLUMN_OF", "WALL.EDGE_SPEED"];
const stored = (formula: string) => storedSpelling(formula, NAMES);
const shown = (text: string) => shownSpelling(text, NAMES);

/** Spellings as Excel's own files hold them; the add-in prefix and ANCHORARRAY as measured in files with add-in calls, the rest from Microsoft's "Issue: an _xlfn. prefix is displayed" and [MS-XLSX] 2.2.2 (from memory). */
const PAIRS: readonly [string, string][] = [
  ["=WALL.THWAITES_MARCH(A4:A18,B4:B18,nu)", "_xldudf_WALL_THWAITES_MARCH(A4:A18,B4:B18,nu)"],
  ["=SUM(D5#)", "SUM(_xlfn.ANCHORARRAY(D5))"],
  ["=SUM('Läufe ''B'' 第二'!$D$5#)", "SUM(_xlfn.ANCHORARRAY('Läufe ''B'' 第二'!$D$5))"],
  ["=LET(a,2,b,a^2,a+b)", "_xlfn.LET(_xlpm.a,2,_xlpm.b,_xlpm.a^2,_xlpm.a+_xlpm.b)"],
  ["=LET(f,LAMBDA(x,x+1),f(2))", "_xlfn.LET(_xlpm.f,_xlfn.LAMBDA(_xlpm.x,_xlpm.x+1),_xlpm.f(2))"],
  ["=MAP(A1:A3,LAMBDA(v,WALL.EDGE_SPEED(v,20)))", "_xlfn.MAP(A1:A3,_xlfn.LAMBDA(_xlpm.v,_xldudf_WALL_EDGE_SPEED(_xlpm.v,20)))"],
  ["=XLOOKUP(1,A1:A3,B1:B3)", "_xlfn.XLOOKUP(1,A1:A3,B1:B3)"],
  ["=SORT(FILTER(A1:B9,A1:A9>0))", "_xlfn._xlws.SORT(_xlfn._xlws.FILTER(A1:B9,A1:A9>0))"],
  ["=IF(A1=\"D5# LET(x\",-A1^2,5%)", "IF(A1=\"D5# LET(x\",-A1^2,5%)"],
  ["=\"say \"\"WALL.EDGE_SPEED(\"\"\"&A1", "\"say \"\"WALL.EDGE_SPEED(\"\"\"&A1"],
  ["=SUM(Runs[speed ue])+Runs[[#Totals],[run]]", "SUM(Runs[speed ue])+Runs[[#Totals],[run]]"],
  ["=@A1:A9", "_xlfn.SINGLE(A1:A9)"],
  ["=@D5#+@nu*@SUM(@B:B)", "_xlfn.SINGLE(_xlfn.ANCHORARRAY(D5))+_xlfn.SINGLE(nu)*_xlfn.SINGLE(SUM(_xlfn.SINGLE(B:B)))"],
  ["=SUM(Runs[@speed])", "SUM(Runs[@speed])"],
  ["=STDEV.S(A1:A9)", "_xlfn.STDEV.S(A1:A9)"],
  ["=LOG10(A1)", "LOG10(A1)"],
];

describe("stored spelling", () => {
  it.each(PAIRS)("%s is stored as %s, and read back", (plain, text) => {
    expect(stored(plain)).toBe(text);
    expect(shown(text)).toBe(plain);
  });

  it("reads add-in calls in any case, and plain ones", () => {
    expect(shown("_XLDUDF_wall_Edge_Speed(1,2)")).toBe("=WALL.EDGE_SPEED(1,2)");
    expect(shown("wall.edge_speed(1,2)")).toBe("=WALL.EDGE_SPEED(1,2)");
  });

  const leaf = fc.constantFrom("1.5E-5", "A1", "$B$2:$C$9", "'Wall''s run 2'!B2", "\"a\"\"b#(\"", "D5#", "'Läufe 第二'!D5#", "TRUE", "{1,2;3,4}", "Runs[speed ue]", "nu_air", "#N/A", "5%");
  const { formula } = fc.letrec<{ formula: string }>((tie) => ({
    formula: fc.oneof(
      { depthSize: "small", withCrossShrink: true },
      leaf,
      fc.tuple(tie("formula"), fc.constantFrom("+", "-", "*", "/", "^", "&", "=", "<>", ">="), tie("formula")).map((p) => p.join("")),
      tie("formula").map((a) => `-(${a})`),
      tie("formula").map((a) => `@(${a})`),
      fc.tuple(fc.constantFrom("SUM", "XLOOKUP", "SORT", "IFNA", "STDEV.S", "TEXTJOIN", ...NAMES), fc.array(tie("formula"), { maxLength: 3 })).map(([name, args]) => `${name}(${args.join(", ")})`),
      fc.tuple(tie("formula"), tie("formula")).map(([a, b]) => `LET(u,${a},w_2,${b}+u,u*w_2)`),
      fc.tuple(tie("formula"), tie("formula")).map(([a, b]) => `MAP(${a},LAMBDA(p,q,p+q+${b}))`),
    ),
  }));

  it("goes there and back without a change, whatever the formula", () => {
    fc.assert(
      fc.property(formula, (body) => {
        const plain = "=" + body;
        expect(shown(stored(plain))).toBe(plain);
        expect(stored(shown(stored(plain)))).toBe(stored(plain));
      }),
      { numRuns: 500 },
    );
  });
});
