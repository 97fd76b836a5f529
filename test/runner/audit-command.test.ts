import { mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { Workbook } from "exceljs";
import { auditCommand } from "../../src/runner/audit-command";
import type { AuditedCell } from "../../src/runner/audit-book";
import { recalcCommand } from "../../src/runner/recalc-command";

const BOOK = readFileSync("test/references/third-party-book.xlsx");
let folder: string;
const at = (name: string) => path.join(folder, name);
const audited = (file: string): AuditedCell[] => JSON.parse(auditCommand([at(file), "--format", "json"]).out) as AuditedCell[];

beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), "wallsheet-audit-"));
  writeFileSync(at("in.xlsx"), BOOK);
});
afterEach(() => rmSync(folder, { recursive: true }));

/** An invented book by exceljs; every formula's stored value is 0. */
async function write(file: string, formulas: Record<string, string>): Promise<void> {
  const book = new Workbook();
  const sheet = book.addWorksheet("Wall");
  for (let i = 0; i < 12; i++) {
    sheet.getCell(`A${i + 2}`).value = i / 40;
    sheet.getCell(`B${i + 2}`).value = 10 * (1 - i / 40);
    sheet.getCell(`C${i + 2}`).value = 10;
  }
  for (const [place, formula] of Object.entries(formulas)) {
    const [cell, ref] = place.split("|");
    sheet.getCell(cell!).value = (ref === undefined ? { formula, result: 0 } : { formula, shareType: "array", ref, result: 0 }) as never;
  }
  writeFileSync(at(file), new Uint8Array(await book.xlsx.writeBuffer()));
}

describe("wallsheet audit", () => {
  it("tells stale from calculated by what comes out, and shows an error's sentence", () => {
    const before = audited("in.xlsx");
    expect(before.map((c) => [`${c.sheet}!${c.cell}`, c.functions.join(), c.state])).toEqual([
      ["Wing!D3", "THWAITES_MARCH", "stale"],
      ["Wing!I3", "COLUMN_OF", "stale"],
      ["Wing!J3", "WALL_BLOW_VELOCITY", "stale"],
      ["Wing!M8", "EDGE_SPEED", "stale"],
      ["Wing!M10", "EDGE_SPEED", "error"],
      ["Läufe 'B' 第二!D4", "EDGE_SPEED", "stale"],
    ]);
    // The file holds its heading "station x", the first station and zeros; G3:G18 are words: 4 × 16 less D3, D4, E4 and F4, which are 0 at x = 0.
    expect(before[0]).toMatchObject({ block: "D3:G18", why: "60 of 64 stored values differ from what comes out", inputs: [], beyond: [] });
    expect(before[4]!.why).toBe("#VALUE! EDGE_SPEED needs cp of at most 1; row 1 has 2");
    recalcCommand([at("in.xlsx"), "-o", at("out.xlsx")]);
    expect(audited("out.xlsx").map((c) => c.state)).toEqual(["calculated", "calculated", "calculated", "calculated", "error", "calculated"]);
    expect(readdirSync(folder).sort()).toEqual(["in.xlsx", "out.xlsx"]);
    expect(readFileSync(at("in.xlsx")).equals(BOOK)).toBe(true);
  });

  it("ends with 0 where nothing is found, with 1 where the range is left or an input is amiss", async () => {
    await write("plate.xlsx", { "E1|E1:Q13": "_xldudf_WALL_THWAITES_MARCH(A2:A13,C2:C13,0.000015)" });
    await write("far.xlsx", { "E1|E1:Q13": "_xldudf_WALL_THWAITES_MARCH(A2:A13,B2:B13,0.000015)" });
    await write("units.xlsx", { "E1|E1:Q13": "_xldudf_WALL_THWAITES_MARCH(A2:A13,C2:C13,15)" });
    for (const name of ["plate", "far", "units"]) recalcCommand([at(`${name}.xlsx`), "--in-place"]);
    expect([auditCommand([at("plate.xlsx")]).status, auditCommand([at("far.xlsx")]).status, auditCommand([at("units.xlsx")]).status]).toEqual([0, 1, 1]);
    expect(audited("plate.xlsx")).toEqual([expect.objectContaining({ state: "calculated", why: "", inputs: [], beyond: [], notes: [expect.stringMatching(/^at 0: Thwaites, plane wall/)] })]);
    // Thwaites' method separates ue ∝ 1 − x at x = 0.123 (White 1991, table 4-5, from memory): the stations behind are separated.
    const [far] = audited("far.xlsx");
    expect(far).toMatchObject({ state: "calculated", inputs: [], beyond: ["separated in rows 7 to 13 of its block, from station x 0.125"] });
    expect(far!.notes[1]).toMatch(/laminar separation at x = 0\.12/);
    // Re = 10 · 0.275 / 15.
    expect(audited("units.xlsx")[0]).toMatchObject({ state: "calculated", inputs: ["Reynolds number: 0.183 for the whole column (check the units of x, ue and nu)"] });
  });

  it("checks the inputs of a march inside another formula, by names, and says where it cannot", async () => {
    await write("in2.xlsx", {
      E1: "ROWS(_xldudf_WALL_THWAITES_MARCH(A2:A6,C2:C6,0.000015))",
      F1: "_xlfn.LET(_xlpm.n,15,ROWS(_xldudf_WALL_ENERGY_MARCH(A2:A13,C2:C13,_xlpm.n)))",
      G1: "_xldudf_WALL_NOSUCH(A2:A13,1,1)",
      H1: "A1+1",
      I1: "\"WALL.EDGE_SPEED(1,2)\"",
      J1: "SUM(_xldudf_WALL_THWAITES_MARCH(A2:A13,A2:A13*0-1,0.000015))",
    });
    const cells = audited("in2.xlsx");
    expect(cells.map((c) => [c.cell, c.functions.join(), c.state])).toEqual([["E1", "THWAITES_MARCH", "stale"], ["F1", "ENERGY_MARCH", "stale"], ["G1", "NOSUCH", "left"], ["J1", "THWAITES_MARCH", "error"]]);
    expect(cells[0]!.inputs).toEqual(["stations: only 5 (add stations where ue bends)"]);
    expect(cells[1]!.inputs).toEqual(["the inputs of ENERGY_MARCH could not be checked on their own"]);
    expect(cells[2]!.why).toMatch(/the function WALL_NOSUCH, unknown here/);
    expect(cells[3]!.inputs.join()).toMatch(/^ue: INPUT_CHECK needs .* \(mend this first\)$/);
  });

  it("writes a table to read, JSON, and CSV in which no text is run as a formula", async () => {
    await write("far.xlsx", { "E1|E1:Q13": "_xldudf_WALL_THWAITES_MARCH(A2:A13,B2:B13,0.000015)" });
    const table = auditCommand([at("far.xlsx")]);
    expect(table.out).toMatch(/^Wall!E1 {2}THWAITES_MARCH {2}stale {2}\d+ of \d+ stored values differ from what comes out\n {4}range {3}separated in rows 7 to 13[^\n]*\n {4}note {4}at 0: /);
    expect(table.complaints[0]).toMatch(/far\.xlsx: 1 WALL cells, 1 with findings$/);
    expect(table.complaints.join()).toMatch(/preliminary-design estimates/);
    const csv = auditCommand([at("far.xlsx"), "--format", "csv"]).out.split("\r\n");
    expect(csv[0]).toBe("sheet,cell,block,functions,state,why,inputs,beyond range,notes");
    expect(csv[1]).toMatch(/^Wall,E1,E1:Q13,THWAITES_MARCH,stale,/);
    expect(csv).toHaveLength(3);
    const renamed = new Workbook();
    renamed.addWorksheet("=cmd()").getCell("A1").value = { formula: "_xldudf_WALL_EDGE_SPEED(0,3)", result: 3 } as never;
    writeFileSync(at("evil.xlsx"), new Uint8Array(await renamed.xlsx.writeBuffer()));
    expect(auditCommand([at("evil.xlsx"), "--format", "csv", "-q"])).toEqual({ status: 0, complaints: [], out: expect.stringContaining("\r\n'=cmd(),A1,") });
  });

  it("refuses in one sentence, with 2", () => {
    writeFileSync(at("bad.xlsx"), BOOK.subarray(0, 6000));
    for (const args of [[], [at("none.xlsx")], [folder], [at("bad.xlsx")], [at("in.xlsx"), "--format", "xml"], [at("in.xlsx"), "--format", "toString"], [at("in.xlsx"), "more"]]) {
      const { status, out, complaints } = auditCommand(args);
      expect([status, out, complaints.length]).toEqual([2, "", 1]);
    }
    expect(auditCommand(["--help"])).toMatchObject({ status: 0, out: expect.stringContaining("--format") });
  });
});
