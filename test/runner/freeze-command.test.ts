import { mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { Workbook, type Worksheet } from "exceljs";
import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { CAUTIONS } from "../../src/cells/cautions";
import { engineHere } from "../../src/runner/engine-here";
import { freezeCommand } from "../../src/runner/freeze-command";
import { recalculate } from "../../src/runner/recalculate";

const BOOK = readFileSync("test/references/third-party-book.xlsx");
const DAY = "2026-01-31";
let folder: string;
const at = (name: string) => path.join(folder, name);

beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), "wallsheet-freeze-"));
  writeFileSync(at("in.xlsx"), BOOK);
});
afterEach(() => rmSync(folder, { recursive: true }));

/** Read by exceljs, which shares no code with this project. */
async function opened(bytes: Uint8Array): Promise<Workbook> {
  const book = new Workbook();
  await book.xlsx.load(bytes.slice().buffer as never);
  return book;
}
function formulasOf(book: Workbook): string[] {
  const found: string[] = [];
  book.eachSheet((sheet) => sheet.eachRow((row) => row.eachCell((cell) => cell.formula && found.push(cell.formula))));
  return found;
}
const notesOf = (sheet: Worksheet, cell: string, item: string): string[] => {
  const found: string[] = [];
  sheet.eachRow((row) => row.getCell(2).value === cell && row.getCell(3).value === item && found.push(String(row.getCell(4).value)));
  return found;
};
const part = (bytes: Uint8Array, name: string) => strFromU8(unzipSync(bytes)[name]!);
function frozen(file = "in.xlsx", ...more: string[]): Uint8Array {
  freezeCommand([at(file), "-o", at("out.xlsx"), "--date", DAY, ...more]);
  return new Uint8Array(readFileSync(at("out.xlsx")));
}

describe("wallsheet freeze of XlsxWriter's book", () => {
  it("leaves values and no WALL formula, for a reader that shares no code with us; the rest goes on as formulas", async () => {
    const { status, out, complaints } = freezeCommand([at("in.xlsx"), "-o", at("out.xlsx"), "--date", DAY]);
    expect([status, out]).toEqual([1, ""]); // one cell of the book shows an error
    expect(complaints).toEqual([expect.stringMatching(/^Wing!M9: left/), expect.stringMatching(/^Wing!M10: #VALUE!/), `${at("out.xlsx")}: 6 WALL cells frozen; notes in the sheet "method notes"`]);
    const bytes = new Uint8Array(readFileSync(at("out.xlsx")));
    const book = await opened(bytes);
    const wing = book.getWorksheet("Wing")!;
    // Thwaites (1949) on ue = 20 (1 − x) in closed form: θ² = 0.45 ν (1 − (1 − x)⁶) / (6 · 20 (1 − x)⁶).
    for (let i = 1; i < 15; i++) {
      const x = (0.1 * i) / 14;
      const theta = Math.sqrt((0.45 * 1.5e-5 * (1 - (1 - x) ** 6)) / 6 / 20 / (1 - x) ** 6);
      expect(wing.getCell(`D${4 + i}`).value).toBeCloseTo(x, 14);
      expect(Math.abs((wing.getCell(`E${4 + i}`).value as number) / theta - 1)).toBeLessThan(1e-9);
      for (const cell of [`F${4 + i}`, `I${3 + i}`, `J${3 + i}`]) expect(typeof wing.getCell(cell).value).toBe("number");
      expect(wing.getCell(`G${4 + i}`).value).toBe("laminar");
    }
    expect(wing.getCell("M8").value).toBeCloseTo(20 * Math.sqrt(1.5), 12); // Bernoulli, cp = −0.5
    expect(wing.getCell("M10").value).toEqual({ error: "#VALUE!" });
    const formulas = formulasOf(book);
    expect(formulas.filter((f) => /WALL|ANCHORARRAY/i.test(f))).toEqual([]);
    // What read a spill reads its block now.
    expect(formulas).toEqual(expect.arrayContaining(["SUM(J3:J17)", "MAX(INDEX(D3:G18,0,2))", "20*(1-A4)"]));
    expect(recalculate(engineHere(), bytes).counts.wall).toBe(0);
    expect(recalculate(engineHere(), bytes).bytes).toBe(bytes);
  });

  it("keeps every other part byte for byte, and in the sheets all cells but the frozen and the recalculated ones", () => {
    const before = unzipSync(BOOK);
    const after = unzipSync(frozen());
    const changed = ["[Content_Types].xml", "xl/_rels/workbook.xml.rels", "xl/worksheets/sheet1.xml", "xl/worksheets/sheet2.xml", "xl/workbook.xml"];
    expect(Object.keys(after).sort()).toEqual([...Object.keys(before), "xl/worksheets/sheet3.xml"].sort());
    for (const name of Object.keys(before)) expect([name, Buffer.from(after[name]!).equals(Buffer.from(before[name]!))]).toEqual([name, !changed.includes(name)]);
    const cells = /<c r="(?:[D-G](?:[3-9]|1[0-8])|[IJ](?:[3-9]|1[0-7])|M\d+)"[^>]*?(?:\/>|>.*?<\/c>)/g;
    expect(strFromU8(after["xl/worksheets/sheet1.xml"]!).replace(cells, "")).toBe(strFromU8(before["xl/worksheets/sheet1.xml"]!).replace(cells, ""));
    expect(strFromU8(after["xl/workbook.xml"]!).replace('<sheet name="method notes" sheetId="3" r:id="rId7"/>', "")).toBe(strFromU8(before["xl/workbook.xml"]!));
    // A frozen cell is no dynamic array any more and keeps its style.
    expect(strFromU8(after["xl/worksheets/sheet1.xml"]!)).toContain('<c r="D3" s="2" t="str"><v>station x</v></c>');
  });

  it("tells of each cell what was calculated how, when, by which version, and with which caution", async () => {
    const notes = (await opened(frozen())).getWorksheet("method notes")!;
    const head = [1, 2, 3, 4].map((row) => String(notes.getCell(`A${row}`).value));
    expect(head[0]).toMatch(/Wallsheet \d+\.\d+\.\d+, 2026-01-31\.$/);
    for (const caution of CAUTIONS) expect(head).toContain(caution);
    expect(notesOf(notes, "D3", "formula")).toEqual(["=WALL.THWAITES_MARCH(A4:A18,edge_speeds,nu_air,A21:B21)"]);
    expect(notesOf(notes, "D3", "values in")).toEqual(["D3:G18"]);
    expect(notesOf(notes, "D3", "input")).toEqual(["Wing!A4:A18", "edge_speeds = Wing!B4:B18", "nu_air = Wing!B20", "Wing!A21:B21"]);
    expect(notesOf(notes, "D3", "method")).toEqual([expect.stringMatching(/^THWAITES_MARCH: Marches a laminar layer/)]);
    expect(notesOf(notes, "D3", "valid range").length).toBeGreaterThan(0);
    expect(notesOf(notes, "D3", "source").join()).toContain("Thwaites, B., Aero. Quart. 1 (1949)");
    expect(notesOf(notes, "J3", "input")).toEqual(["Wing!A4:A18", "I3# = Wing!I3:I17"]);
    expect(notesOf(notes, "D4", "input")).toEqual(["Runs[speed ue] = 'Läufe ''B'' 第二'!B4:B6"]);
    expect(notesOf(notes, "M10", "warning")).toEqual(["#VALUE! EDGE_SPEED needs cp of at most 1; row 1 has 2"]);
    // Nothing on the sheet is a formula, though much looks like one.
    expect(part(frozen(), "xl/worksheets/sheet3.xml")).not.toMatch(/<f[ >]|<v>/);
    notes.eachRow((row) => row.eachCell((cell) => expect([cell.formula, typeof cell.value]).toEqual([undefined, "string"])));
  });

  it("gives the same bytes for the same day, and freezes the values as stored when told so", async () => {
    expect(Buffer.from(frozen()).equals(Buffer.from(frozen()))).toBe(true);
    const book = await opened(frozen("in.xlsx", "--as-stored"));
    expect(book.getWorksheet("Wing")!.getCell("E5").value).toBe(0);
    expect(notesOf(book.getWorksheet("method notes")!, "D3", "warning")).toEqual(["the value as the file held it, not calculated anew for this copy"]);
  });
});

describe("wallsheet freeze of a book by exceljs", () => {
  it("freezes fixed arrays and shared formulas, takes the next free name, and notes where the method's range ended", async () => {
    const made = new Workbook();
    made.created = made.modified = new Date(Date.UTC(2026, 0, 1));
    const sheet = made.addWorksheet("Duct wall"); // invented
    for (let i = 0; i < 12; i++) {
      sheet.getCell(`A${i + 2}`).value = i / 40;
      sheet.getCell(`B${i + 2}`).value = 10 * (1 - i / 40); // Howarth's flow: separates at x = 0.1199 by the full equations (Howarth 1938)
    }
    sheet.getCell("D1").value = { formula: "_xldudf_WALL_THWAITES_MARCH(A2:A13,B2:B13,0.000015)", shareType: "array", ref: "D1:P13", result: "" } as never;
    sheet.getCell("R2").value = { formula: "_xldudf_WALL_EDGE_SPEED(A2-1,10)", result: 0 } as never;
    sheet.getCell("R3").value = { sharedFormula: "R2", result: 0 } as never;
    sheet.getCell("S2").value = { formula: "R2&\" =1+1\"", result: "" } as never;
    made.addWorksheet("Method Notes").getCell("A1").value = "taken";
    writeFileSync(at("made.xlsx"), new Uint8Array(await made.xlsx.writeBuffer()));
    const book = await opened(frozen("made.xlsx"));
    expect(book.worksheets.map((s) => s.name)).toEqual(["Duct wall", "Method Notes", "method notes 2"]);
    expect(formulasOf(book)).toEqual(['R2&" =1+1"']);
    const wall = book.getWorksheet("Duct wall")!;
    // Bernoulli: 10 √(1 − cp) with cp = x − 1.
    expect([wall.getCell("R2").value, wall.getCell("R3").value]).toEqual([10 * Math.sqrt(2), 10 * Math.sqrt(2 - 1 / 40)]);
    const notes = book.getWorksheet("method notes 2")!;
    expect(notesOf(notes, "R3", "formula")).toEqual(["=WALL.EDGE_SPEED(A3-1,10)"]);
    expect(notesOf(notes, "D1", "warning")).toEqual([expect.stringMatching(/^separated in rows 7 to 13 of its block, from station x 0\.125$/)]);
    expect(notesOf(notes, "D1", "note").join()).toMatch(/laminar separation at x = 0\.12/);
  });

  it("copies a book without WALL cells byte for byte", () => {
    const parts = unzipSync(BOOK);
    for (const name of ["xl/worksheets/sheet1.xml", "xl/worksheets/sheet2.xml"]) parts[name] = strToU8(strFromU8(parts[name]!).replace(/<f[^>]*>[^<]*_xldudf[^<]*<\/f>/g, "").replace(/ cm="1"/g, ""));
    const plain = zipSync(parts);
    writeFileSync(at("plain.xlsx"), plain);
    expect(freezeCommand([at("plain.xlsx"), "-o", at("out.xlsx")])).toMatchObject({ status: 0, complaints: [expect.stringContaining("no cell calls a WALL function")] });
    expect(readFileSync(at("out.xlsx")).equals(Buffer.from(plain))).toBe(true);
  });
});

describe("what freeze asks for and refuses", () => {
  it("writes beside the book unless told, and over nothing by itself", () => {
    expect(freezeCommand([at("in.xlsx")]).status).toBe(1);
    expect(readdirSync(folder).sort()).toEqual(["in-plain.xlsx", "in.xlsx"]);
    expect(freezeCommand([at("in.xlsx")])).toMatchObject({ status: 2, complaints: [expect.stringContaining("exists already")] });
    expect(freezeCommand([at("in.xlsx"), "-o", at("in.xlsx")])).toMatchObject({ status: 2, complaints: [expect.stringContaining("over its input")] });
    expect(readFileSync(at("in.xlsx")).equals(BOOK)).toBe(true);
  });

  it("takes today's day unless told another, which must be one of the calendar", () => {
    freezeCommand([at("in.xlsx"), "-q"], "2031-02-03");
    expect(part(new Uint8Array(readFileSync(at("in-plain.xlsx"))), "xl/worksheets/sheet3.xml")).toContain(", 2031-02-03.");
    for (const day of ["2026-02-30", "1.2.2026", "2026-1-2", "=1+1"]) expect(freezeCommand([at("in.xlsx"), "--date", day])).toMatchObject({ status: 2, complaints: [expect.stringContaining("day of the calendar")] });
  });

  it("refuses unreadable and missing books in one sentence, with 2, and writes nothing", () => {
    writeFileSync(at("bad.xlsx"), "x;ue\n0;1\n");
    for (const args of [[at("bad.xlsx")], [at("none.xlsx")], [folder, "-o", at("x.xlsx")], [], [at("in.xlsx"), "-o", at("no/out.xlsx")]]) {
      const { status, out, complaints } = freezeCommand(args);
      expect([status, out, complaints.length]).toEqual([2, "", 1]);
    }
    expect(readdirSync(folder).sort()).toEqual(["bad.xlsx", "in.xlsx"]);
    expect(freezeCommand(["--help"])).toMatchObject({ status: 0, out: expect.stringContaining("--as-stored") });
  });
});
