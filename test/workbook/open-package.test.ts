import { strToU8, zipSync } from "fflate";
import { readFileSync } from "node:fs";
import { openPackage, partText } from "../../src/workbook/open-package";
import { readWorkbook } from "../../src/workbook/read-workbook";
import { writePackage } from "../../src/workbook/write-package";

const file = new Uint8Array(readFileSync("test/references/third-party-book.xlsx"));

test("a package comes back with the same parts in order, the same bytes each time", () => {
  const book = openPackage(file);
  const again = openPackage(writePackage(book));
  expect([...again.parts.keys()]).toEqual([...book.parts.keys()]);
  for (const [name, data] of book.parts) expect(Buffer.compare(Buffer.from(again.parts.get(name)!), Buffer.from(data))).toBe(0);
  expect(Buffer.compare(Buffer.from(writePackage(book)), Buffer.from(writePackage(book)))).toBe(0);
});

test.each<[string, Uint8Array, string]>([
  ["text", strToU8("station x,ue\n0,1\n"), "The file is not an .xlsx book: it is not a zip package."],
  ["nothing", new Uint8Array(0), "The file is not an .xlsx book"],
  ["a password-protected book", Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1), "password-protected or an old .xls book"],
  ["half a file", file.slice(0, file.length / 2), "The file is damaged or cut short"],
  ["another zip", zipSync({ "a.txt": strToU8("a") }), "its package holds no workbook"],
  ["a part outside the package", zipSync({ "../a.txt": strToU8("a") }), "points outside the package"],
  ["a zip bomb", zipSync({ "xl/workbook.xml": new Uint8Array(40 * 1024 * 1024) }), "unpacks to over 500 times its size"],
  ["a document type", zipSync({ "xl/workbook.xml": strToU8('<!DOCTYPE a [<!ENTITY b "c">]><workbook/>') }), "declares a document type"],
])("%s is refused in one sentence", (_what, bytes, sentence) => {
  expect(() => readWorkbook(bytes)).toThrow(sentence);
});

test("a part whose bytes are spoilt is refused", () => {
  const broken = file.slice();
  broken.fill(0x55, 60, 400);
  expect(() => readWorkbook(broken)).toThrow(/^The file is damaged/);
});

test("too many parts are refused", () => {
  const many = Object.fromEntries(Array.from({ length: 10_001 }, (_, i) => [`p${i}`, new Uint8Array(0)]));
  expect(() => openPackage(zipSync(many, { level: 0 }))).toThrow("its package has 10001 parts, more than 10000");
});

test("a part's text is read as UTF-8", () => {
  expect(partText(openPackage(file), "xl/workbook.xml")).toContain("第二");
});
