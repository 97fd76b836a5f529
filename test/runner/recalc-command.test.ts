import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
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
      "Wing!M9: left for Excel, its stored value kept: it uses CUBEVALUE, which reads a data model",
      "Wing!M10: #VALUE! EDGE_SPEED needs cp of at most 1; row 1 has 2",
      expect.stringMatching(/in\.xlsx: 30 formulas calculated, 6 with WALL functions; \d+ cells changed$/),
    ]);
    expect(readdirSync(folder).sort()).toEqual(["in.xlsx", "out.xlsx"]);
    expect(readFileSync(at("in.xlsx")).equals(BOOK)).toBe(true);
    recalcCommand([at("out.xlsx"), "-o", at("again.xlsx"), "--quiet"]);
    expect(readFileSync(at("again.xlsx")).equals(readFileSync(at("out.xlsx")))).toBe(true);
  });

  describe("--check", () => {
    // Wing!M3 is the sum of the blow velocities: an invented error of 1e-6 of it is put into a book that was right.
    const spoiled = () => {
      recalcCommand([at("in.xlsx"), "-o", at("right.xlsx")]);
      const parts = unzipSync(readFileSync(at("right.xlsx")));
      const sheet = "xl/worksheets/sheet1.xml";
      parts[sheet] = strToU8(strFromU8(parts[sheet]!).replace(/(<c r="M3"[^>]*>(?:(?!<\/c>).)*<v>)([^<]*)/, (_all, head: string, value: string) => head + Number(value) * (1 + 1e-6)));
      writeFileSync(at("spoiled.xlsx"), zipSync(parts));
    };

    it("passes a book that holds what is calculated, naming what it could not compare, and writes nothing", () => {
      recalcCommand([at("in.xlsx"), "-o", at("right.xlsx")]);
      const { status, out, complaints } = recalcCommand(["--check", at("right.xlsx")]);
      expect([status, out]).toEqual([0, ""]);
      expect(complaints.at(-1)).toMatch(/right\.xlsx: 30 formulas compared, 1 not calculated here; 0 cells differ$/);
      expect(readdirSync(folder).sort()).toEqual(["in.xlsx", "right.xlsx"]);
    });

    it("names the cells that differ by more than the tolerance, and ends with 1", () => {
      spoiled();
      const { status, out } = recalcCommand(["--check", "-q", at("spoiled.xlsx")]);
      expect(status).toBe(1);
      expect(out).toMatch(/^Wing!M3: stored \S+, calculated \S+, apart by 1\.0e-6 of the larger\n/);
      expect(recalcCommand(["--check", "-q", "--tolerance", "1e-5", at("spoiled.xlsx")])).toEqual({ status: 0, out: "", complaints: [] });
      expect(recalcCommand(["--check", "-q", "--floor", "1", at("spoiled.xlsx")]).status).toBe(0);
      expect(recalcCommand(["--check", "-q", "--tolerance", "1e-7", at("spoiled.xlsx")]).status).toBe(1);
    });

    it("tells words, errors and empty cells apart", () => {
      const { status, out } = recalcCommand(["--check", "-q", at("in.xlsx")]);
      expect(status).toBe(1);
      expect(out).toContain("calculated #VALUE!");
    });

    it.each([
      [["--check", "-o", "out.xlsx"], /--check writes no book/],
      [["--tolerance", "1e-3", "-o", "out.xlsx"], /belong to --check/],
      [["--check", "--tolerance", "little"], /--tolerance needs a number/],
      [["--check", "--floor=-1"], /--floor needs a number/],
    ])("%j is refused with 2", (args, sentence) => {
      const { status, complaints } = recalcCommand([...args, at("in.xlsx")]);
      expect(status).toBe(2);
      expect(complaints[0]).toMatch(sentence);
    });
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
