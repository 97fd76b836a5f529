import { strToU8 } from "fflate";
import type { BookPackage } from "../../src/workbook/open-package";
import { relationships } from "../../src/workbook/relationships";

const book = (part: string, xml: string): BookPackage => ({ parts: new Map([[part, strToU8(xml)]]), entries: new Map() });
const link = (target: string, more = "") => `<Relationship Id="r1" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/worksheet" Target="${target}"${more}/>`;
const target = (written: string) => relationships(book("xl/_rels/workbook.xml.rels", `<Relationships>${link(written)}</Relationships>`), "xl/workbook.xml")[0]?.target;

// Targets are relative to the part or absolute in the package (ECMA-376 part 2, 9.3).
test.each([
  ["worksheets/sheet1.xml", "xl/worksheets/sheet1.xml"],
  ["./worksheets/sheet1.xml", "xl/worksheets/sheet1.xml"],
  ["../tables/table1.xml", "tables/table1.xml"],
  ["/xl/worksheets/sheet1.xml", "xl/worksheets/sheet1.xml"],
  ["../../../../etc/passwd", "etc/passwd"], // never above the package
  ["a%20b.xml", "xl/a b.xml"],
  ["a%zz.xml", "xl/a%zz.xml"],
  ["a&amp;b.xml", "xl/a&b.xml"],
])("%s, seen from xl/workbook.xml, is %s", (written, path) => {
  expect(target(written)).toBe(path);
});

test("the last word of the type is kept, targets outside the package are not, and a part without links has none", () => {
  const parts = book("_rels/.rels", `<p:Relationships xmlns:p="r"><p:${link("xl/workbook.xml").slice(1)}${link("http://example.org", ' TargetMode="External"')}</p:Relationships>`);
  expect(relationships(parts, "")).toEqual([{ id: "r1", kind: "worksheet", target: "xl/workbook.xml" }]);
  expect(relationships(parts, "xl/workbook.xml")).toEqual([]);
});
