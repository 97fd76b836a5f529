import { readFileSync } from "node:fs";
import { readSheet } from "../../src/workbook/read-sheet";
import { readWorkbook } from "../../src/workbook/read-workbook";
import { plainText, xmlText } from "../../src/workbook/xml-text";
import fc from "fast-check";

const book = readWorkbook(new Uint8Array(readFileSync("test/references/third-party-book.xlsx")));

test("sheets, names and tables of a third-party book are found", () => {
  expect(book.sheets.map((s) => s.name)).toEqual(["Wing", "Läufe 'B' 第二"]);
  expect(book.names).toEqual([
    { name: "edge_speeds", sheet: undefined, text: "Wing!$B$4:$B$18" },
    { name: "local_start", sheet: "Wing", text: "0.5" },
    { name: "nu_air", sheet: undefined, text: "Wing!$B$20" },
    { name: "twice", sheet: undefined, text: "2*nu_air" },
  ]);
  expect(book.tables).toEqual([{ name: "Runs", sheet: "Läufe 'B' 第二", ref: "A3:B6", hasHeadings: true, hasTotals: false, columns: ["run", "speed ue"] }]);
  expect(book.from1904).toBe(false);
});

test("every kind of cell is read", () => {
  const xml = `<x:worksheet xmlns:x="m"><x:sheetData><x:row r="2"><x:c r="A2" t="s"><x:v>1</x:v></x:c><x:c t="b"><x:v>1</x:v></x:c><x:c r="D2" t="e"><x:v>#N/A</x:v></x:c></x:row>
    <x:row><x:c t="inlineStr"><x:is><x:r><x:t>a&lt;</x:t></x:r><x:rPh sb="0" eb="1"><x:t>no</x:t></x:rPh><x:r><x:t xml:space="preserve"> b</x:t></x:r></x:is></x:c><x:c r="B3"/><x:c r="C3"><x:f>A2&amp;"&gt;"</x:f><x:v>2.5</x:v></x:c><x:c r="D3" t="str"><x:f t="shared" si="0" ref="D3:D4">1</x:f><x:v>x_x000A_y</x:v></x:c></x:row></x:sheetData></x:worksheet>`;
  const cells = readSheet(xml, ["zero", "one"]);
  expect([...cells.values()].map((c) => [c.reference, c.value])).toEqual([["A2", "one"], ["B2", true], ["D2", { error: "#N/A" }], ["A3", "a< b"], ["B3", null], ["C3", 2.5], ["D3", "x\ny"]]);
  expect(cells.get("C3")!.formula).toEqual({ text: 'A2&">"', kind: "plain" });
  expect(cells.get("D3")!.formula).toEqual({ text: "1", kind: "shared", shared: "0", ref: "D3:D4" });
  for (const c of cells.values()) expect(xml.slice(c.at, c.at + c.length)).toMatch(/^<x:c[\s\S]*(\/>|<\/x:c>)$/);
});

test("text survives the way into XML and back", () => {
  fc.assert(fc.property(fc.string({ unit: "binary" }), (text) => expect(plainText(xmlText(text))).toBe(text)));
});
