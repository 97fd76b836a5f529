import fc from "fast-check";
import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { plainCopy } from "../../src/workbook/plain-copy";
import { readWorkbook } from "../../src/workbook/read-workbook";
import { wallCells } from "../../src/workbook/wall-cells";
import type { NotesRequest } from "../../src/workbook/method-notes";

/** A book by hand, for what the writers of the other tests do not make; `NS` and prefixes as the Open XML SDK writes them where asked. */
const NS = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
const LINKS = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const SHEET = "xl/worksheets/sheet1.xml";
const request: NotesRequest = {
  methods: [{ name: "EDGE_SPEED", purpose: "Gives the edge speed.", limits: ["cp ≤ 1"], sources: ["Bernoulli <1738> & others"] }],
  version: "9.9.9",
  date: "2026-01-31",
  cautions: ["Check it."],
  remarks: () => ({ warnings: ["=HYPERLINK(\"x\")"], notes: [] }),
};

interface Extra {
  rows: string;
  tail?: string;
  workbook?: string;
  names?: string;
  calcChain?: boolean;
  table?: string;
}
function bookOf({ rows, tail = "", names = "", calcChain = false, table = "" }: Extra, x = ""): Uint8Array {
  const declared = x === "" ? `xmlns="${NS}" xmlns:r="${LINKS}"` : `xmlns:x="${NS}"`;
  const sheetLink = x === "" ? 'r:id="rId1"' : `xmlns:q="${LINKS}" q:id="rId1"`;
  const parts: Record<string, string> = {
    "[Content_Types].xml": `<Types xmlns="t"><Default Extension="xml" ContentType="application/xml"/>${calcChain ? '<Override PartName="/xl/calcChain.xml" ContentType="c"/>' : ""}<Override PartName="/xl/workbook.xml" ContentType="w"/></Types>`,
    "_rels/.rels": `<Relationships><Relationship Id="a" Type="${LINKS}/officeDocument" Target="xl/workbook.xml"/></Relationships>`,
    "xl/workbook.xml": `<${x}workbook ${declared}><${x}sheets><${x}sheet name="S" sheetId="5" ${sheetLink}/></${x}sheets>${names}</${x}workbook>`,
    "xl/_rels/workbook.xml.rels": `<Relationships><Relationship Id="rId1" Type="${LINKS}/worksheet" Target="worksheets/sheet1.xml"/>${calcChain ? `<Relationship Id="rId2" Type="${LINKS}/calcChain" Target="calcChain.xml"/>` : ""}</Relationships>`,
    [SHEET]: `<${x}worksheet ${declared}><${x}sheetData>${rows}</${x}sheetData>${tail}</${x}worksheet>`,
    ...(calcChain ? { "xl/calcChain.xml": '<calcChain><c r="A1" i="5"/></calcChain>' } : {}),
    ...(table === "" ? {} : { "xl/worksheets/_rels/sheet1.xml.rels": `<Relationships><Relationship Id="t" Type="${LINKS}/table" Target="../tables/t.xml"/></Relationships>`, "xl/tables/t.xml": table }),
  };
  return zipSync(Object.fromEntries(Object.entries(parts).map(([name, text]) => [name, strToU8(text)])));
}
function copied(bytes: Uint8Array) {
  const copy = plainCopy(readWorkbook(bytes), request);
  const parts = Object.fromEntries(Object.entries(unzipSync(copy.bytes)).map(([name, data]) => [name, strFromU8(data)]));
  return { ...copy, parts };
}
const inside = (parts: Record<string, string>) => /sheetData>(.*)<\/(?:x:)?sheetData>/.exec(parts[SHEET]!)![1];

describe("plainCopy", () => {
  it("drops formula, array and metadata marks, and keeps values, styles and digits as written", () => {
    const { parts, cells } = copied(
      bookOf({
        rows: '<row r="1"><c r="A1" s="3" cm="1" vm="2" t="e"><f t="array" ref="A1:A3">_xldudf_WALL_EDGE_SPEED({1;0;-3},10)</f><v>#VALUE!</v></c></row><row r="2"><c r="A2" s="4" vm="1"><v>10.0</v></c></row><row r="3"><c r="A3" t="s"><v>0</v></c><c r="B3"><f>A2*2</f><v>20</v></c></row>',
      }),
    );
    expect(inside(parts)).toBe('<row r="1"><c r="A1" s="3" t="e"><v>#VALUE!</v></c></row><row r="2"><c r="A2" s="4"><v>10.0</v></c></row><row r="3"><c r="A3" t="s"><v>0</v></c><c r="B3"><f>A2*2</f><v>20</v></c></row>');
    expect(cells.map((c) => [c.cell.reference, c.functions])).toEqual([["A1", ["EDGE_SPEED"]]]);
  });

  it("leaves an empty cell where a formula has no value", () => {
    expect(inside(copied(bookOf({ rows: '<row r="1"><c r="A1" t="str"><f>WALL.EDGE_SPEED(0,1)</f></c></row>' })).parts)).toBe('<row r="1"><c r="A1"></c></row>');
  });

  it("finds WALL calls behind names, LAMBDA names, any case, a broken link, and not in texts", () => {
    const names = '<definedNames><definedName name="speed">_xldudf_WALL_EDGE_SPEED(0,S!$H$1)</definedName><definedName name="lam">_xlfn.LAMBDA(_xlpm.c,WALL.EDGE_SPEED(_xlpm.c,9))</definedName><definedName name="loop">loop(1)</definedName></definedNames>';
    const formulas = ["speed*2", "lam(0)", "wall.edge_speed(0,1)", "[1]!WALL.EDGE_SPEED(0,1)", "\"WALL.EDGE_SPEED(0,1)\"", "loop(1)", "WALLS(1)"];
    const bytes = bookOf({ names, rows: formulas.map((f, i) => `<row r="${i + 1}"><c r="A${i + 1}"><f>${f}</f><v>1</v></c></row>`).join("") });
    expect(wallCells(readWorkbook(bytes)).map((c) => c.cell.reference)).toEqual(["A1", "A2", "A3", "A4"]);
    const { remaining, parts } = copied(bytes);
    expect(remaining).toEqual(["the name speed", "the name lam"]);
    expect(parts["xl/worksheets/sheet2.xml"]).toContain("Still calling functions of Wallsheet, and without effect where they are missing: the name speed; the name lam.");
    expect(parts["xl/worksheets/sheet2.xml"]).toContain(">=WALL.EDGE_SPEED(0,1)<");
  });

  it("gives spill references to frozen cells their blocks in cells, shared formulas, names, validations and conditional formats", () => {
    const { parts } = copied(
      bookOf({
        rows: '<row r="1"><c r="A1" cm="1"><f t="array" ref="A1:A2">_xldudf_WALL_EDGE_SPEED({1;0},10)</f><v>0</v></c><c r="C1"><f t="shared" ref="C1:C2" si="0">SUM(_xlfn.ANCHORARRAY(A1))&lt;5</f><v>1</v></c><c r="D1" cm="1"><f t="array" ref="D1">MAX(_xlfn.ANCHORARRAY(list))</f><v>1</v></c></row><row r="2"><c r="A2"><v>10</v></c><c r="C2"><f t="shared" si="0"/><v>1</v></c></row>',
        names: '<definedNames><definedName name="list">S!$A$1</definedName><definedName name="all">_xlfn.ANCHORARRAY(S!$A$1)</definedName></definedNames>',
        tail: '<conditionalFormatting sqref="B1"><cfRule type="expression"><formula>COUNT(_xlfn.ANCHORARRAY($A$1))&gt;1</formula></cfRule></conditionalFormatting><dataValidations><dataValidation type="list"><formula1>_xlfn.ANCHORARRAY($A$1)</formula1></dataValidation></dataValidations><extLst><ext><x14:dataValidation><x14:formula1><xm:f>_xlfn.ANCHORARRAY(S!$A$1)</xm:f></x14:formula1></x14:dataValidation></ext></extLst>',
      }),
    );
    expect(parts[SHEET]).toContain("<x14:formula1><xm:f>S!$A$1:$A$2</xm:f></x14:formula1>");
    expect(inside(parts)).toContain('<c r="C1"><f>SUM(A1:A2)&lt;5</f><v>1</v></c><c r="D1" cm="1"><f t="array" ref="D1">MAX(S!$A$1:$A$2)</f><v>1</v></c>');
    // The second cell of the shared formula read A2#, which is no frozen spill: it keeps its own text.
    expect(inside(parts)).toContain('<c r="C2"><f>SUM(_xlfn.ANCHORARRAY(A2))&lt;5</f><v>1</v></c>');
    expect(parts["xl/workbook.xml"]).toContain('<definedName name="all">S!$A$1:$A$2</definedName>');
    expect(parts[SHEET]).toContain("<formula>COUNT($A$1:$A$2)&gt;1</formula>");
    expect(parts[SHEET]).toContain("<formula1>$A$1:$A$2</formula1>");
  });

  it("names the conditional formats and validations that go on calling WALL functions", () => {
    const { remaining } = copied(
      bookOf({
        rows: '<row r="1"><c r="A1"><f>WALL.EDGE_SPEED(0,1)</f><v>1</v></c></row>',
        tail: '<conditionalFormatting sqref="B1"><cfRule type="expression"><formula>WALL.EDGE_SPEED(0,1)&gt;1</formula></cfRule></conditionalFormatting><dataValidations><dataValidation><formula1>1</formula1></dataValidation></dataValidations><x14:dataValidation><x14:formula1><xm:f>WALL.EDGE_SPEED(0,1)</xm:f></x14:formula1></x14:dataValidation>',
      }),
    );
    expect(remaining).toEqual(["a conditional format of the sheet S", "a validation of the sheet S"]);
  });

  it("drops the calculation chain whole, with link and content type, and a table's own WALL formula", () => {
    const table = '<table name="T" displayName="T" ref="A1:B2"><tableColumns><tableColumn name="a"><calculatedColumnFormula>_xldudf_WALL_EDGE_SPEED(0,1)</calculatedColumnFormula></tableColumn><tableColumn name="b"><calculatedColumnFormula>1+1</calculatedColumnFormula></tableColumn></tableColumns></table>';
    const { parts } = copied(bookOf({ rows: '<row r="1"><c r="A1"><f>_xldudf_WALL_EDGE_SPEED(0,1)</f><v>1</v></c></row>', calcChain: true, table }));
    expect(Object.keys(parts).filter((name) => /calc/i.test(name))).toEqual([]);
    expect(parts["[Content_Types].xml"]).not.toMatch(/calcChain/);
    expect(parts["xl/_rels/workbook.xml.rels"]).not.toMatch(/calcChain/);
    expect(parts["xl/tables/t.xml"]).toBe(table.replace("<calculatedColumnFormula>_xldudf_WALL_EDGE_SPEED(0,1)</calculatedColumnFormula>", ""));
  });

  it("adds its sheet in the book's own prefixes, id after the highest, with a link of its own", () => {
    const { parts } = copied(bookOf({ rows: '<x:row r="1"><x:c r="A1" cm="1"><x:f t="array" ref="A1">_xldudf_WALL_EDGE_SPEED(0,1)</x:f><x:v>1</x:v></x:c></x:row>' }, "x:"));
    expect(inside(parts)).toBe('<x:row r="1"><x:c r="A1"><x:v>1</x:v></x:c></x:row>');
    expect(parts["xl/workbook.xml"]).toContain(`<x:sheet name="method notes" sheetId="6" xmlns:r="${LINKS}" r:id="rId2"/></x:sheets>`);
    expect(parts["[Content_Types].xml"]).toContain('<Override PartName="/xl/worksheets/sheet2.xml"');
    expect(parts["xl/worksheets/sheet2.xml"]).toContain(`<worksheet xmlns="${NS}">`);
    expect(readWorkbook(zipSync(Object.fromEntries(Object.entries(parts).map(([n, t]) => [n, strToU8(t)])))).sheets.map((s) => s.name)).toEqual(["S", "method notes"]);
  });

  it("stores whatever the notes say as text, and reads it back unchanged", () => {
    const text = fc.oneof(fc.constantFrom("=1+1", "+A1", "@x", "-2", "</t></is><f>1</f>", "_x0041_", " a ", "a\nb", "\u0001"), fc.string({ minLength: 1, unit: "grapheme" }));
    const bytes = bookOf({ rows: '<row r="1"><c r="A1"><f>WALL.EDGE_SPEED(0,1)</f><v>1</v></c></row>' });
    fc.assert(
      fc.property(text, text, (one, two) => {
        const copy = plainCopy(readWorkbook(bytes), { ...request, cautions: [one], remarks: () => ({ warnings: [], notes: [two] }) });
        const notes = readWorkbook(copy.bytes).sheets[1]!;
        const values = [...notes.cells.values()];
        expect(values.filter((c) => c.formula)).toEqual([]);
        expect(values.every((c) => c.attributes["t"] === "inlineStr")).toBe(true);
        expect(values.map((c) => c.value)).toEqual(expect.arrayContaining([one, two]));
      }),
    );
  });

  it("is a pure function: the same book and request give the same bytes, and the book is not changed", () => {
    const bytes = bookOf({ rows: '<row r="1"><c r="A1"><f>WALL.EDGE_SPEED(0,1)</f><v>1</v></c></row>' });
    const book = readWorkbook(bytes);
    const once = plainCopy(book, request).bytes;
    expect(Buffer.from(plainCopy(book, request).bytes).equals(Buffer.from(once))).toBe(true);
    expect(Buffer.from(plainCopy(readWorkbook(bytes), request).bytes).equals(Buffer.from(once))).toBe(true);
  });

  it("takes a block that claims the whole sheet in its stride, and refuses damaged packages in a sentence", () => {
    const bytes = bookOf({ rows: '<row r="1"><c r="A1" cm="1"><f t="array" ref="A1:XFD1048576">WALL.EDGE_SPEED(0,1)</f><v>1</v></c><c r="B1" cm="1"><v>2</v></c></row>' });
    const { parts } = copied(bytes);
    expect(inside(parts)).toBe('<row r="1"><c r="A1"><v>1</v></c><c r="B1"><v>2</v></c></row>');
    const damaged = (change: (files: Record<string, Uint8Array>) => void) => {
      const files = unzipSync(bytes);
      change(files);
      return () => plainCopy(readWorkbook(zipSync(files)), request);
    };
    expect(damaged((files) => delete files["[Content_Types].xml"])).toThrow(/part \[Content_Types\]\.xml is missing/);
    expect(damaged((files) => (files["[Content_Types].xml"] = strToU8("<Types/>")))).toThrow(/an end tag of Types is missing/);
  });
});
