import fc from "fast-check";
import { cellName } from "../../src/workbook/cell-reference";
import { patchSheet, type CellEdit } from "../../src/workbook/patch-sheet";
import { readSheet } from "../../src/workbook/read-sheet";

const sheet = (data: string) => {
  const xml = `<worksheet><dimension ref="A1:B3"/><sheetViews/>${data}<pageMargins left="0.7"/></worksheet>`;
  return { xml, cells: readSheet(xml, []) };
};
const rows = '<sheetData><row r="1" spans="1:2" ht="20"><c r="A1" s="3"><f>1+1</f><v>0</v></c><c r="B1" s="4"/></row><row r="3"/></sheetData>';
const patched = (data: string, edits: Record<string, CellEdit>) => patchSheet(sheet(data), new Map(Object.entries(edits)));

test("nothing to change leaves the very text", () => {
  const s = sheet(rows);
  expect(patchSheet(s, new Map([["A1", { value: 0 }], ["C9", { value: null }]]))).toBe(s.xml);
});

test("a value is replaced inside its cell; formula, style and neighbours stay", () => {
  expect(patched(rows, { A1: { value: 2 } })).toBe(sheet(rows).xml.replace("<v>0</v>", "<v>2</v>"));
});

test("each kind of value is written with its type", () => {
  const kinds: [CellEdit["value"], string][] = [
    [true, '<c r="A1" s="3" t="b"><f>1+1</f><v>1</v></c>'],
    ["a<b", '<c r="A1" s="3" t="str"><f>1+1</f><v>a&lt;b</v></c>'],
    [{ error: "#N/A" }, '<c r="A1" s="3" t="e"><f>1+1</f><v>#N/A</v></c>'],
    [null, '<c r="A1" s="3"><f>1+1</f></c>'],
  ];
  for (const [value, cell] of kinds) expect(patched(rows, { A1: { value } })).toContain(cell);
});

test("new cells go into their rows in order, new rows between old ones, and hints grow", () => {
  const out = patched(rows, { D1: { value: 4 }, C1: { value: 3 }, B2: { value: 5 }, A3: { value: 6 }, A5: { value: 7 } });
  expect(out).toContain('<row r="1" spans="1:4" ht="20"><c r="A1" s="3"><f>1+1</f><v>0</v></c><c r="B1" s="4"/><c r="C1"><v>3</v></c><c r="D1"><v>4</v></c></row><row r="2"><c r="B2"><v>5</v></c></row><row r="3"><c r="A3"><v>6</v></c></row><row r="5"><c r="A5"><v>7</v></c></row></sheetData>');
  expect(out).toContain('<dimension ref="A1:D5"/>');
});

test("a styled empty cell takes a value and keeps its style", () => {
  expect(patched(rows, { B1: { value: "x" } })).toContain('<c r="B1" s="4" t="str"><v>x</v></c>');
});

test("an array formula's block is renewed", () => {
  const array = '<sheetData><row r="1"><c r="A1" cm="1"><f t="array" ref="A1:A2">X()</f><v>1</v></c></row></sheetData>';
  expect(patched(array, { A1: { value: 1, ref: "A1:A3" } })).toContain('<c r="A1" cm="1"><f t="array" ref="A1:A3">X()</f><v>1</v></c>');
});

test("an empty sheet and prefixed elements are filled in their own way", () => {
  expect(patched("<sheetData/>", { A2: { value: 1 } })).toContain('<sheetData><row r="2"><c r="A2"><v>1</v></c></row></sheetData>');
  expect(patched('<x:sheetData><x:row r="1"></x:row></x:sheetData>', { A1: { value: 1 } })).toContain('<x:row r="1"><x:c r="A1"><x:v>1</x:v></x:c></x:row>');
});

test("any edits: read again, edited cells hold the new values, all others their bytes, and rows and cells stand in order", () => {
  const place = fc.tuple(fc.integer({ min: 1, max: 30 }), fc.integer({ min: 1, max: 12 })).map(([c, r]) => cellName(c, r));
  const value = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }).map((v) => v + 0), fc.boolean(), fc.string({ unit: "binary", minLength: 1 }), fc.constant({ error: "#N/A" }));
  const cells = fc.dictionary(place, fc.integer({ min: 0, max: 9 }));
  fc.assert(
    fc.property(cells, fc.dictionary(place, value), (old, edits) => {
      const byRow = groupedByRow(Object.keys(old));
      const column = (name: string) => /[A-Z]+/.exec(name)![0].padStart(3);
      const inOrder = [...byRow].sort((a, b) => a[0] - b[0]).map(([row, names]) => `<row r="${row}">${names.sort((a, b) => (column(a) < column(b) ? -1 : 1)).map((n) => `<c r="${n}" s="${old[n]}"><v>${old[n]}</v></c>`).join("")}</row>`);
      const before = sheet(`<sheetData>${inOrder.join("")}</sheetData>`);
      const xml = patchSheet(before, new Map(Object.entries(edits).map(([name, v]) => [name, { value: v }])));
      const after = readSheet(xml, []);
      expect(new Set(after.keys())).toEqual(new Set([...Object.keys(old), ...Object.keys(edits)]));
      for (const [name, cell] of after) {
        expect(cell.value).toEqual(name in edits ? edits[name] : old[name]);
        if (!(name in edits)) expect(xml.slice(cell.at, cell.at + cell.length)).toBe(`<c r="${name}" s="${old[name]}"><v>${old[name]}</v></c>`);
      }
      const order = [...after.keys()].map((name) => Number(/\d+/.exec(name)![0]) * 1000 + column(name).split("").reduce((n, c) => n * 26 + (c === " " ? 0 : c.charCodeAt(0) - 64), 0));
      expect(order).toEqual([...order].sort((a, b) => a - b));
      expect(patchSheet({ xml, cells: after }, new Map(Object.entries(edits).map(([name, v]) => [name, { value: v }])))).toBe(xml);
    }),
    { numRuns: 200 },
  );
});

function groupedByRow(names: readonly string[]): Map<number, string[]> {
  const rowsOf = new Map<number, string[]>();
  for (const name of names) {
    const row = Number(/\d+/.exec(name)![0]);
    rowsOf.set(row, [...(rowsOf.get(row) ?? []), name]);
  }
  return rowsOf;
}
