import { chmodSync, linkSync, mkdtempSync, readdirSync, readFileSync, rmSync, statSync, symlinkSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { recalcCommand } from "../../src/runner/recalc-command";

const BOOK = readFileSync("test/references/third-party-book.xlsx");
let folder: string;
const at = (name: string) => path.join(folder, name);

beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), "wallsheet-recalc-"));
  writeFileSync(at("in.xlsx"), BOOK);
});
afterEach(() => rmSync(folder, { recursive: true }));

describe("wallsheet recalc", () => {
  it("writes the new book, reports what it could not calculate with cell, function and reason, and ends with 1", () => {
    const { status, out, complaints } = recalcCommand([at("in.xlsx"), "-o", at("out.xlsx")]);
    expect([status, out]).toEqual([1, ""]);
    expect(complaints).toEqual([
      "Wing!M9: left for Excel, its stored value kept: it uses the function CUBEVALUE, unknown here",
      "Wing!M10: #VALUE! EDGE_SPEED needs cp of at most 1; row 1 has 2",
      expect.stringMatching(/in\.xlsx: 30 formulas calculated, 6 with WALL functions; \d+ cells changed$/),
    ]);
    expect(readdirSync(folder).sort()).toEqual(["in.xlsx", "out.xlsx"]);
    expect(readFileSync(at("in.xlsx")).equals(BOOK)).toBe(true);
    recalcCommand([at("out.xlsx"), "-o", at("again.xlsx"), "--quiet"]);
    expect(readFileSync(at("again.xlsx")).equals(readFileSync(at("out.xlsx")))).toBe(true);
  });

  it("says nothing with --quiet", () => {
    expect(recalcCommand([at("in.xlsx"), "-o", at("out.xlsx"), "-q"])).toEqual({ status: 1, out: "", complaints: [] });
  });

  it("writes over its input only when told so, under whatever name it goes", () => {
    symlinkSync(at("in.xlsx"), at("link.xlsx"));
    linkSync(at("in.xlsx"), at("hard.xlsx"));
    for (const name of ["in.xlsx", "link.xlsx", "hard.xlsx", `../${path.basename(folder)}/in.xlsx`]) {
      const { status, complaints } = recalcCommand([at("in.xlsx"), "-o", at(name)]);
      expect([status, complaints]).toEqual([2, ["wallsheet: recalc would write over its input; say --in-place if that is meant"]]);
    }
    expect(readFileSync(at("in.xlsx")).equals(BOOK)).toBe(true);
    chmodSync(at("in.xlsx"), 0o640);
    expect(recalcCommand(["--in-place", at("link.xlsx")]).status).toBe(1);
    expect(readFileSync(at("in.xlsx")).equals(BOOK)).toBe(false);
    expect(statSync(at("in.xlsx")).mode & 0o777).toBe(0o640);
  });

  it.each<[string, Uint8Array, RegExp]>([
    ["a password-protected book", Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1), /password-protected/],
    ["text", Buffer.from("x;ue\n0;1\n"), /not a zip package/],
    ["a truncated book", BOOK.subarray(0, 6000), /cut short/],
  ])("refuses %s in one sentence, with 2, and writes nothing", (_what, bytes, sentence) => {
    writeFileSync(at("bad.xlsx"), bytes);
    const { status, out, complaints } = recalcCommand([at("bad.xlsx"), "-o", at("out.xlsx")]);
    expect([status, out, complaints.length]).toEqual([2, "", 1]);
    expect(complaints[0]).toMatch(sentence);
    expect(readdirSync(folder).sort()).toEqual(["bad.xlsx", "in.xlsx"]);
  });

  it("says why a file cannot be read or written", () => {
    expect(recalcCommand([at("none.xlsx"), "-o", at("out.xlsx")]).complaints[0]).toMatch(/cannot read .*none\.xlsx: there is no such file/);
    expect(recalcCommand([folder, "-o", at("out.xlsx")]).complaints[0]).toMatch(/cannot read .*: it is a folder/);
    expect(recalcCommand([at("in.xlsx"), "-o", at("no/out.xlsx")])).toMatchObject({ status: 2, complaints: [expect.stringMatching(/cannot write .*no\/out\.xlsx: there is no such file or folder/)] });
    expect(recalcCommand([at("in.xlsx"), "-o", folder])).toMatchObject({ status: 2, complaints: [expect.stringMatching(/cannot write .*: it is no ordinary file/)] });
  });

  it("asks for what is missing", () => {
    expect(recalcCommand([])).toMatchObject({ status: 2, complaints: [expect.stringMatching(/needs one workbook/)] });
    expect(recalcCommand([at("in.xlsx")])).toMatchObject({ status: 2, complaints: [expect.stringMatching(/needs -o/)] });
    expect(recalcCommand([at("in.xlsx"), "--in-place", "-o", at("x")])).toMatchObject({ status: 2 });
    expect(recalcCommand(["--help"])).toMatchObject({ status: 0, complaints: [], out: expect.stringContaining("--in-place") });
  });
});
