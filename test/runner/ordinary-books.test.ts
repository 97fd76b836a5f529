import { Workbook } from "exceljs";
import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { engineHere } from "../../src/runner/engine-here";
import { recalculate } from "../../src/runner/recalculate";

/** Books made in the test itself: by exceljs, a writer that shares no code with this project, and by hand for what no writer makes. */
const engine = engineHere();
const SHEET = "xl/worksheets/sheet1.xml";

async function written(fill: (book: Workbook) => void): Promise<Uint8Array> {
  const book = new Workbook();
  book.created = book.modified = new Date(Date.UTC(2026, 0, 1));
  fill(book);
  return new Uint8Array(await book.xlsx.writeBuffer());
}

/** Read again by exceljs: the value a formula cell shows. */
async function read(bytes: Uint8Array): Promise<(cell: string, sheet?: string) => unknown> {
  const book = new Workbook();
  await book.xlsx.load(bytes.slice().buffer as never);
  return (cell, sheet) => {
    const { value } = (sheet === undefined ? book.worksheets[0]! : book.getWorksheet(sheet)!).getCell(cell);
    if (value !== null && typeof value === "object" && ("formula" in value || "sharedFormula" in value)) return (value as { result?: unknown }).result;
    return value;
  };
}

/** A book of one sheet with these rows. */
function withRows(rows: string): Uint8Array {
  const parts = unzipSync(byHand([]));
  parts[SHEET] = strToU8(`<worksheet><sheetData>${rows}</sheetData></worksheet>`);
  return zipSync(parts);
}

/** Column A holds formulas with the value 5 stored; H1:H3 hold 3, 4, 5. */
function byHand(formulas: readonly string[], settings = "", more = ""): Uint8Array {
  const xml = (text: string) => text.replace(/&/g, "&amp;").replace(/</g, "&lt;");
  const rows = Array.from({ length: Math.max(3, formulas.length) }, (_, i) => {
    const formula = formulas[i] === undefined ? "" : `<c r="A${i + 1}"><f>${xml(formulas[i])}</f><v>5</v></c>`;
    return `<row r="${i + 1}">${formula}${i < 3 ? `<c r="H${i + 1}"><v>${3 + i}</v></c>` : ""}${i === 0 ? more : ""}</row>`;
  });
  const parts: Record<string, string> = {
    "_rels/.rels": '<Relationships><Relationship Id="a" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/officeDocument" Target="/xl/workbook.xml"/></Relationships>',
    "xl/workbook.xml": `<workbook xmlns:r="r">${settings}<sheets><sheet name="S" sheetId="1" r:id="r1"/><sheet name="Wall's run 2" sheetId="2" r:id="r2"/></sheets></workbook>`,
    "xl/_rels/workbook.xml.rels": ["worksheets/sheet1.xml", "/xl/worksheets/sheet2.xml"].map((target, i) => `<Relationship Id="r${i + 1}" Type="t/worksheet" Target="${target}"/>`).join(""),
    [SHEET]: `<worksheet><sheetData>${rows.join("")}</sheetData></worksheet>`,
    "xl/worksheets/sheet2.xml": '<worksheet><sheetData><row r="1"><c r="A1"><v>7</v></c><c r="C1" cm="1"><f t="array" ref="C1">_xldudf_WALL_EDGE_SPEED({1;0.75;0;-3},10)</f><v>0</v></c></row></sheetData></worksheet>',
  };
  return zipSync(Object.fromEntries(Object.entries(parts).map(([name, text]) => [name, strToU8(text)])));
}

function storedCell(bytes: Uint8Array, cell: string): string {
  return new RegExp(`<c r="${cell}"[^>]*>.*?</c>`).exec(strFromU8(unzipSync(bytes)[SHEET]!))![0].replace(/<f[ >].*?<\/f>/, "");
}

describe("recalc of a book by exceljs", () => {
  it("fills the fixed block of an array formula, and what reads it", async () => {
    const file = await written((book) => {
      const sheet = book.addWorksheet("Wall's run 2"); // invented
      sheet.getColumn(1).width = 14;
      sheet.addRow(["cp (invented)", "speed"]);
      [1, 0.75, 0, -3].forEach((cp, i) => (sheet.getCell(`A${i + 2}`).value = cp));
      sheet.getCell("C2").value = { formula: "_xldudf_WALL_EDGE_SPEED(A2:A5,10)", shareType: "array", ref: "C2:C5" } as never;
      sheet.getCell("E1").value = { formula: "SUM(C2:C5)", result: 0 } as never;
      sheet.getCell("E2").value = { formula: "A2*10", result: 0 } as never;
      sheet.getCell("E3").value = { sharedFormula: "E2", result: 0 } as never;
      sheet.getCell("E4").value = { formula: "IF(A4=0,\"zero & <none>\",1)", result: "" } as never;
      sheet.getCell("E5").value = { formula: "A5<0", result: false } as never;
      sheet.getCell("F1").note = "left alone";
      book.addWorksheet("second").getCell("B2").value = { formula: "'Wall''s run 2'!E1*2", result: 0 } as never;
    });
    const { bytes, notes } = recalculate(engine, file);
    expect(notes).toEqual([]);
    const value = await read(bytes);
    // Bernoulli: ue = 10 √(1 − cp).
    expect(["C3", "C4", "C5"].map((c) => value(c))).toEqual([5, 10, 20]);
    expect(value("E1")).toBe(35);
    expect([value("E2"), value("E3"), value("E4"), value("E5")]).toEqual([10, 7.5, "zero & <none>", true]);
    expect(value("B2", "second")).toBe(70);
    expect(recalculate(engine, bytes).bytes).toBe(bytes);
    const before = unzipSync(file);
    const after = unzipSync(bytes);
    for (const name of Object.keys(before)) if (!/worksheets\/sheet\d/.test(name)) expect(Buffer.from(after[name]!).equals(Buffer.from(before[name]!))).toBe(true);
  });

  it("lets a dynamic spill grow below and beside the used part of the sheet", async () => {
    const file = await written((book) => {
      const sheet = book.addWorksheet("Plate"); // invented
      [0, 0.5, 1].forEach((x, i) => (sheet.getCell(`A${i + 1}`).value = x));
      sheet.getCell("C2").value = { formula: "_xldudf_WALL_THWAITES_MARCH(A1:A3,A1:A3*0+2,0.00002)", shareType: "array", ref: "C2", result: 0 } as never;
    });
    const parts = unzipSync(file);
    // exceljs cannot mark a cell as dynamic.
    parts[SHEET] = strToU8(strFromU8(parts[SHEET]!).replace('<c r="C2"', '<c r="C2" cm="1"'));
    const { bytes } = recalculate(engine, zipSync(parts));
    const xml = strFromU8(unzipSync(bytes)[SHEET]!);
    const [, ref, column] = /ref="(C2:([A-Z]+)5)"/.exec(xml)!;
    expect(xml).toContain(`<dimension ref="A1:${column}5"/>`);
    expect(ref).toMatch(/^C2:[H-Z]5$/);
    expect([...xml.matchAll(/<row r="(\d+)"/g)].map((m) => Number(m[1]))).toEqual([1, 2, 3, 4, 5]);
    for (const row of xml.match(/<row r.*?<\/row>/g)!) {
      const columns = [...row.matchAll(/<c r="([A-Z]+)\d+"/g)].map((m) => m[1]!.padStart(3));
      expect(columns).toEqual([...columns].sort());
      const spans = /spans="(\d+):(\d+)"/.exec(row);
      if (spans && columns.length > 0) expect(Number(spans[2])).toBeGreaterThanOrEqual(columns.at(-1)!.trim().charCodeAt(0) - 64);
    }
    // Thwaites on a flat plate: θ = √(0.45 ν x / ue).
    const value = await read(bytes);
    const theta = ["C", "D", "E", "F"].find((c) => value(`${c}2`) === "momentum loss θ")!;
    expect(value(`${theta}5`)).toBeCloseTo(Math.sqrt((0.45 * 2e-5 * 1) / 2), 12);
    expect(recalculate(engine, bytes).bytes).toBe(bytes);
  });
});

describe("formulas the engine does not calculate", () => {
  it.each([
    ["kept", "SUM((H1,H2))", /a form not known here/],
    ["left", "SUM(H1:INDEX(H1:H9,3))", /a form not known here/],
    ["kept", "(", /a form not known here/],
    ["left", "SUM(S:'Wall''s run 2'!A1)", /left for Excel/],
    ["left", "nosuch*2", /the name nosuch, which the book does not define, or only by itself/],
    ["kept", "'[2]Other'!A1", /a link to another book/],
    ["kept", "_xldudf_WALL_NOSUCH(1)", /the function WALL_NOSUCH, unknown here/],
    ["kept", "_xlfn.FUTURE.THING(H1)", /the function FUTURE\.THING, unknown here/],
    ["left", "INDIRECT(\"'Wall''s run 2'!A1\")", /INDIRECT names something not found here/],
    ["left", "INDIRECT(\"R1C8\",FALSE)", /INDIRECT names something not found here/],
    ["kept", "CELL(\"width\",H1)", /CELL, which reads the look and place of cells/],
    ["kept", "SHEETS()", /SHEETS, which counts the book's sheets/],
    ["kept", "A1+1", /a circle of references/],
    ["left", "_xlfn.FUTURE.THING(A2)", /the function FUTURE\.THING, unknown here/],
    ["left", "_xlfn.FUTURE.THING(A1:A4)", /the function FUTURE\.THING, unknown here/],
    ["left", "_xlfn.FUTURE.THING(A:A)", /the function FUTURE\.THING, unknown here/],
    ["left", "_xlfn.FUTURE.THING($1:$2)", /the function FUTURE\.THING, unknown here/],
    ["kept", "_xlfn.FUTURE.THING(B:B,'Wall''s run 2'!A1:A9)", /nothing it reads has changed/],
  ])("%s: %s keeps its stored value, and the cell that reads it uses that", (kind, formula, reason) => {
    const { bytes, notes } = recalculate(engine, byHand([formula, "A1*2"]));
    expect(storedCell(bytes, "A1")).toContain("<v>5</v>");
    expect(notes[0]).toMatchObject({ sheet: "S", cell: "A1", kind, text: expect.stringMatching(reason) });
    if (formula !== "A1+1") expect(storedCell(bytes, "A2")).toContain("<v>10</v>");
  });

  it.each(["RAND()", "TODAY()", "NOW()*1"])("%s keeps its stored value, so that a second run changes nothing", (formula) => {
    const { bytes, notes } = recalculate(engine, byHand([formula, "A1*2"]));
    expect([storedCell(bytes, "A1"), storedCell(bytes, "A2")]).toEqual(['<c r="A1"><v>5</v></c>', '<c r="A2"><v>10</v></c>']);
    expect(notes.map((n) => n.kind)).toEqual(["kept"]);
  });

  it("dates of a book that counts from 1904 are left, plain sums are not", () => {
    const { bytes, notes } = recalculate(engine, byHand(["YEAR(H1+40000)", "H1+H2"], '<workbookPr date1904="1"/>'));
    expect([storedCell(bytes, "A1"), storedCell(bytes, "A2")]).toEqual(['<c r="A1"><v>5</v></c>', '<c r="A2"><v>7</v></c>']);
    expect(notes).toEqual([{ sheet: "S", cell: "A1", kind: "kept", text: expect.stringContaining("counts days from 1904") }]);
  });

  it("doubt is passed on through calculated cells, and the book asks to be recalculated", () => {
    // A2 changes from 5 to 4; A1 hangs on it, A3 on A1, A4 on A3; A5 on nothing that changed.
    const formulas = ["_xlfn.FUTURE.THING(A2)", "H2", "A1", "_xlfn.FUTURE.THING(A3)", "_xlfn.FUTURE.THING(H1)"];
    const file = byHand(formulas);
    const { bytes, notes } = recalculate(engine, file);
    expect(notes.map((n) => [n.cell, n.kind])).toEqual([["A1", "left"], ["A4", "left"], ["A5", "kept"]]);
    const workbook = (b: Uint8Array) => strFromU8(unzipSync(b)["xl/workbook.xml"]!);
    expect(workbook(bytes)).toBe(workbook(file).replace("</sheets>", '</sheets><calcPr fullCalcOnLoad="1"/>'));
    // The second run changes nothing, and does not take the flagged values for good ones.
    const again = recalculate(engine, bytes);
    expect(again.bytes).toBe(bytes);
    expect(again.notes.map((n) => n.kind)).toEqual(["left", "left", "left"]);
  });

  it("SUBTOTAL and AGGREGATE are left in a book with hidden or filtered rows, and calculated in others", () => {
    const rows = (hidden: string) => `<row r="1"><c r="A1"><v>1</v></c><c r="B1"><f>SUBTOTAL(9,A1:A4)</f><v>1</v></c><c r="C1"><f>AGGREGATE(9,3,A1:A4)</f><v>1</v></c></row><row r="2"${hidden}><c r="A2"><v>2</v></c></row><row r="3"><c r="A3"><f>SUBTOTAL(9,A1:A2)</f><v>1</v></c></row><row r="4"><c r="A4"><v>4</v></c></row>`;
    const values = (file: Uint8Array) => ["B1", "C1"].map((cell) => /<v>(.*)<\/v>/.exec(storedCell(file, cell))![1]);
    const shown = recalculate(engine, withRows(rows("")));
    expect([values(shown.bytes), shown.notes]).toEqual([["7", "7"], []]); // the inner subtotal is not counted twice
    const hidden = recalculate(engine, withRows(rows(' ht="15" hidden="1"')));
    expect(values(hidden.bytes)).toEqual(["1", "1"]);
    expect(hidden.notes.map((n) => n.text)).toEqual(expect.arrayContaining([expect.stringContaining("SUBTOTAL, which may skip hidden rows")]));
  });

  it("a TEXT whose format is not known here is left, a cell that joins it is not", () => {
    const { bytes, notes } = recalculate(engine, byHand(['TEXT(H1,"# ?/?")', 'A1&"!"', 'TEXT("abc","0.0")', 'TEXT(H1,"0.0")', 'TEXT("1.25","0.0")']));
    expect(["A1", "A2", "A3", "A4", "A5"].map((cell) => /<v>(.*)<\/v>/.exec(storedCell(bytes, cell))![1])).toEqual(["5", "5!", "abc", "3.0", "1.3"]);
    expect(notes).toEqual([{ sheet: "S", cell: "A1", kind: "kept", text: 'stored value kept: TEXT\'s format "# ?/?" is not known here; nothing it reads has changed' }]);
  });

  it("a formula that has no stored value is left", () => {
    const { notes } = recalculate(engine, withRows('<row r="1"><c r="A1"><f>_xlfn.FUTURE.THING(1)</f></c></row>'));
    expect(notes.map((n) => n.kind)).toEqual(["left"]);
  });
});

describe("formulas and texts as files hold them", () => {
  it.each([
    ["'Wall''s run 2'!A1+1", "<v>8</v>"],
    ["-H1^2", "<v>9</v>"],
    ["SUM(H:H)", "<v>12</v>"],
    ["INDIRECT(\"H2\")", "<v>4</v>"],
    ["SUM(_xlfn.ANCHORARRAY('Wall''s run 2'!C1))", "<v>35</v>"], // 10 √(1 − cp): 0 + 5 + 10 + 20
    ["H1%", "<v>0.03</v>"],
    ["[1]!WALL.EDGE_SPEED(0,H1)", "<v>3</v>"],
    ["wall.edge_speed(0,H1)", "<v>3</v>"],
    ["_xll.wall.edge_speed(0,H1)", "<v>3</v>"],
    ["Wall_Edge_Speed(0,H1)", "<v>3</v>"],
    ["SUM(_xlfn.MAP(H1:H3,_xlfn.LAMBDA(_xlpm.x,_xlpm.x^2)))", "<v>50</v>"],
    ["_xlfn.LET(_xlpm.h,H1,-_xlpm.h^2)", "<v>9</v>"],
    ["_XLDUDF_WALL_EDGE_SPEED(0,H1)", "<v>3</v>"],
    ["I1", "<v>=1+1</v>"],
    ["J1", "<v>1e5</v>"],
    ["K1&\"!\"", "<v>TRUE!</v>"],
    ["Z9", "<v>0</v>"],
    ["H1:H3", "<v>3</v>"], // stored without an array: the row's own value
  ])("%s", (formula, value) => {
    const texts = ["=1+1", "1e5", "TRUE"].map((text, i) => `<c r="${"IJK"[i]}1" t="inlineStr"><is><t>${text}</t></is></c>`).join("");
    expect(storedCell(recalculate(engine, byHand([formula], "", texts)).bytes, "A1")).toContain(value);
  });
});

describe("names, as files hold them", () => {
  const names = {
    nu: "0.5",
    pair: "{2,3}",
    cp: "S!$H$1:$H$3",
    twice: "2*nu",
    square: "_xlfn.LAMBDA(_xlpm.x,_xlpm.x^2)",
    Größe: "'Wall''s run 2'!$A$1",
    gone: "#REF!",
    below: "-nu",
    words: '"a ""quoted"" text"',
    growing: "OFFSET(S!$H$1,0,0,COUNT(S!$H:$H),1)",
  };
  const defined = `<definedNames>${Object.entries(names).map(([name, text]) => `<definedName name="${name}">${text.replace(/</g, "&lt;")}</definedName>`).join("")}<definedName name="nu" localSheetId="1">9</definedName></definedNames>`;

  it.each([
    ["nu*2", "<v>1</v>"],
    ["SUM(pair)", "<v>5</v>"],
    ["SUM(cp)/ROWS(cp)", "<v>4</v>"],
    ["twice^2", "<v>1</v>"],
    ["square(3)+square(-1)", "<v>10</v>"],
    ["SUM(_xlfn.MAP(cp,square))", "<v>50</v>"],
    ["größe*1", "<v>7</v>"],
    ["'Wall''s run 2'!nu", "<v>9</v>"],
    ["[0]!nu", "<v>0.5</v>"],
    ["below^2", "<v>0.25</v>"],
    ["gone", "<v>#REF!</v>"],
    ["LEN(words)", "<v>15</v>"],
    ["SUM(growing)", "<v>12</v>"],
  ])("%s", (formula, value) => {
    expect(storedCell(recalculate(engine, byHand([formula], defined)).bytes, "A1")).toContain(value);
  });
});

describe("array formulas that are left alone", () => {
  const block = (formula: string, ref: string) => `<row r="1"><c r="A1" cm="1"><f t="array" ref="${ref}">${formula}</f><v>1</v></c><c r="B1"><f>SUM(A1:A3)</f><v>0</v></c></row><row r="2"><c r="A2"><v>2</v></c></row><row r="3"><c r="A3"><v>3</v></c></row>`;

  it.each(["_xlfn.FUTURE.THING(H1)", "SUM((H1,H2))"])("%s keeps its whole spilled block, which others go on reading", (formula) => {
    const { bytes, notes } = recalculate(engine, withRows(block(formula, "A1:A3")));
    expect(notes.map((n) => n.kind)).toEqual(["kept"]);
    expect(strFromU8(unzipSync(bytes)[SHEET]!)).toBe(`<worksheet><sheetData>${block(formula, "A1:A3").replace("<v>0</v>", "<v>6</v>")}</sheetData></worksheet>`);
  });

  it("a fixed block larger than the result shows #N/A in the rest", () => {
    const { bytes } = recalculate(engine, withRows('<row r="1"><c r="A1"><f t="array" ref="A1:A3">_xldudf_WALL_EDGE_SPEED({1;0},10)</f><v>9</v></c></row>'));
    expect(strFromU8(unzipSync(bytes)[SHEET]!)).toContain('<v>0</v></c></row><row r="2"><c r="A2"><v>10</v></c></row><row r="3"><c r="A3" t="e"><v>#N/A</v></c></row>');
  });

  it.each([
    ["a column is repeated beside itself", "{1;2}", "A1:B2", "1 1 2 2"],
    ["a row is repeated below itself", "{1,2}", "A1:B2", "1 2 1 2"],
    ["a single value fills the block", "SUM(D1:D2)", "A1:B2", "7 7 7 7"],
    ["a larger result is cut", "D1:D2*{1,2,3}", "A1:B1", "3 6"],
    ["a block of one cell shows the first value", "D1:D2*2", "A1", "6"],
    ["an error fills the block", "1/0+SUM(D1:D2)", "A1:A2", "#DIV/0! #DIV/0!"],
  ])("an array formula of the old kind: %s", (_what, formula, ref, values) => {
    const cell = (at: string, inside = "<v>0</v>") => `<c r="${at}">${inside}</c>`;
    const block = `<f t="array" ref="${ref}">${formula}</f><v>0</v>`;
    const count = `<f>SUM(IF(ISNUMBER(A1:B2),A1:B2,0))</f><v>0</v>`;
    const inBlock = (at: string) => (ref === "A1" || (ref === "A1:B1" && at.endsWith("2")) || (ref === "A1:A2" && at.startsWith("B")) ? "" : cell(at));
    const { bytes } = recalculate(engine, withRows(`<row r="1">${cell("A1", block)}${inBlock("B1")}${cell("D1", "<v>3</v>")}${cell("E1", `<f t="array" ref="E1">${count.replace(/<f>(.*)<\/f>.*/, "$1")}</f><v>0</v>`)}</row><row r="2">${inBlock("A2")}${inBlock("B2")}${cell("D2", "<v>4</v>")}</row>`));
    const xml = strFromU8(unzipSync(bytes)[SHEET]!);
    const shown = [...xml.matchAll(/<c r="([AB])[12]"[^>]*>(?:<f.*?<\/f>)?<v>(.*?)<\/v>/g)].map((m) => m[2]!);
    expect(shown.join(" ")).toBe(values);
    // Who reads the block sees what it shows, and nothing beside it.
    const sum = shown.reduce((s, v) => s + (Number(v) || 0), 0);
    expect(storedCell(bytes, "E1")).toContain(`<v>${sum}</v>`);
  });

  it("shared formulas follow their cells, with names, sheets and strings in them", () => {
    const cell = (at: string, inside: string) => `<c r="${at}">${inside}</c>`;
    const follower = '<f t="shared" si="0"/><v>0</v>';
    const rows = [2, 3, 4].map((a, i) => `<row r="${i + 1}">${cell(`A${i + 1}`, `<v>${a}</v>`)}${cell(`B${i + 1}`, i === 0 ? '<f t="shared" ref="B1:B3" si="0">-A1^2+$A$1+S!A1+SUM(A$1:A1)+LEN("A1")</f><v>0</v>' : follower)}</row>`);
    const { bytes } = recalculate(engine, withRows(rows.join("")));
    // 4+2+2+2+2, 9+2+3+5+2, 16+2+4+9+2
    expect(["B1", "B2", "B3"].map((at) => /<v>(.*)<\/v>/.exec(storedCell(bytes, at))![1])).toEqual(["12", "21", "33"]);
  });

  it("a what-if table keeps its values; whatever changes in the book, it may have read", () => {
    const { notes } = recalculate(engine, withRows('<row r="1"><c r="A1"><f t="dataTable" ref="A1:A2" dt2D="0" r1="B1"/><v>9</v></c></row>'));
    expect(notes).toEqual([{ sheet: "S", cell: "A1", kind: "left", text: expect.stringContaining("a what-if table") }]);
  });
});

describe("files made to exhaust or to mislead", () => {
  const within = 5_000; // ms; each of these ran for minutes or fell over before it was bounded
  it.each<[string, string, RegExp]>([
    ["an address that is none", '<row r="1"><c r="$$"><v>1</v></c></row>', /"\$\$" stands in it as the address/],
    ["an array block with an impossible address", '<row r="1"><c r="A1"><f t="array" ref="A1:ZZZZ99">1</f></c></row>', /"ZZZZ99"/],
    ["a value far out", '<row r="1048576"><c r="A1048576"><v>1</v></c><c r="B1048576"><f>A1048576</f></c></row>', /more than 400000 rows/],
    ["a cell never closed, many times", "<row><c><v>1</v></row>".repeat(20_000), /never closed/],
    ["tags never ended", '<c "'.repeat(40_000) + "<c>", /never closed/],
    ["text where a number should stand", '<row r="1"><c r="E1"><v>abc</v></c></row>', /cell E1 holds "abc"/],
  ])("%s: one sentence", (_what, rows, sentence) => {
    expect(() => recalculate(engine, withRows(rows))).toThrow(sentence);
  }, within);

  it("a fixed block of the whole sheet is left alone", () => {
    const { notes } = recalculate(engine, withRows('<row r="1"><c r="A1"><f t="array" ref="A1:XFD1048576">1+1</f><v>0</v></c></row>'));
    expect(notes[0]?.text).toMatch(/17179869184 cells/);
  }, within);

  it("formulas 10 000 brackets deep are left alone", () => {
    const deep = ["(".repeat(10_000) + "1" + ")".repeat(10_000), "-".repeat(10_000) + "1", "ABS(".repeat(10_000) + "1" + ")".repeat(10_000)];
    expect(recalculate(engine, byHand(deep)).notes.map((n) => n.kind)).toEqual(["kept", "kept", "kept"]);
  }, within);
});
