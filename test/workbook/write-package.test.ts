import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { openPackage } from "../../src/workbook/open-package";
import { writePackage } from "../../src/workbook/write-package";

const bytes = zipSync({
  "z.xml": [strToU8("<z>" + "text ".repeat(50) + "</z>"), { level: 9, mtime: new Date(2021, 4, 6, 7, 8, 10) }],
  "a/ä.xml": [strToU8("<b/>"), { level: 0, mtime: new Date(1999, 11, 31, 23, 59, 58) }],
});

describe("writePackage", () => {
  it("gives back the very bytes of a package in which nothing changed", () => {
    expect(Buffer.from(writePackage(openPackage(bytes))).equals(Buffer.from(bytes))).toBe(true);
  });

  it("packs a changed and a new part, keeps the order, the old stamps and every other part's packed bytes", () => {
    const book = openPackage(bytes);
    const parts = new Map(book.parts);
    parts.set("a/ä.xml", strToU8("<b>new</b>"));
    parts.set("n.xml", strToU8("<n/>"));
    const once = writePackage({ ...book, parts });
    expect(Buffer.from(writePackage({ ...book, parts })).equals(Buffer.from(once))).toBe(true);
    const again = openPackage(once);
    expect([...again.parts.keys()]).toEqual(["z.xml", "a/ä.xml", "n.xml"]);
    expect(again.entries.get("a/ä.xml")!.entry.stamp).toBe(book.entries.get("a/ä.xml")!.entry.stamp);
    expect(Buffer.from(again.entries.get("z.xml")!.entry.packed).equals(Buffer.from(book.entries.get("z.xml")!.entry.packed))).toBe(true);
    // Read by another unpacker than ours.
    const unpacked = unzipSync(once);
    expect(Object.fromEntries(Object.entries(unpacked).map(([name, data]) => [name, strFromU8(data).slice(0, 10)]))).toEqual({ "z.xml": "<z>text te", "a/ä.xml": "<b>new</b>", "n.xml": "<n/>" });
  });
});
