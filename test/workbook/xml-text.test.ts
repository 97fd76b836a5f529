import { attributes, elements, plainText, plainXml, scanElements, xmlText } from "../../src/workbook/xml-text";

test("entities and character references are resolved; the workbook's own escapes only in text", () => {
  expect(plainXml("a &lt; b &amp;amp; &quot;&apos;&gt; &#233;&#x4e8c;&#x1F600; &unknown;")).toBe("a < b &amp; \"'> é二😀 &unknown;");
  expect(plainXml("_x000D_")).toBe("_x000D_");
  expect(plainText("a_x000D__x005F_x0041_")).toBe("a\r_x0041_"); // ECMA-376 part 1, 22.9.2.19 ST_Xstring
  expect(xmlText("_x0041_ & <\u0001>")).toBe("_x005F_x0041_ &amp; &lt;_x0001_&gt;");
});

test("attributes stand in either kind of quotes, with spaces and prefixes", () => {
  expect(attributes(` r="A1" t = 's' xml:space="preserve" q="a>'b"`)).toEqual({ r: "A1", t: "s", "xml:space": "preserve", q: "a>'b" });
});

test("elements are found with any prefix, empty or not, and not by the beginning of another name", () => {
  const xml = `<cols><col/></cols><c r="1"/><x:c r='2>'>two</x:c ><c>\n<v>3</v></c><cc/>`;
  expect(elements(xml, "c").map((e) => [e.attributes["r"], e.inside, xml.slice(e.at, e.at + e.length)])).toEqual([
    ["1", "", '<c r="1"/>'],
    ["2>", "two", "<x:c r='2>'>two</x:c >"],
    [undefined, "\n<v>3</v>", "<c>\n<v>3</v></c>"],
  ]);
  expect([...scanElements(xml, "c", 1, xml.indexOf("<x:c"))]).toHaveLength(1);
  expect(() => elements("<c><v>1</v>", "c")).toThrow("The file is damaged: <c> is opened in it and never closed.");
});
