import { readFileSync } from "node:fs";
import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { engineHere } from "../../src/runner/engine-here";
import { recalculate } from "../../src/runner/recalculate";

/** Made by XlsxWriter (test/references/make-third-party-book.py); the scenario is invented. */
const book = new Uint8Array(readFileSync("test/references/third-party-book.xlsx"));
const WING = "xl/worksheets/sheet1.xml";
const RUNS = "xl/worksheets/sheet2.xml";
const engine = engineHere();

/** The value of a cell, read from the XML by a plain search and not by the reader under test. */
function stored(bytes: Uint8Array, part: string, cell: string): string | undefined {
  const xml = strFromU8(unzipSync(bytes)[part]!);
  const written = new RegExp(`<c r="${cell}"(?: [^>]*[^/])?>.*?</c>`).exec(xml)?.[0];
  return /<v>(.*?)<\/v>/.exec(written ?? "")?.[1];
}
const number = (bytes: Uint8Array, cell: string, part = WING) => Number(stored(bytes, part, cell) ?? NaN);

// ue = 20 (1 − x), ν = 1.5e-5. Thwaites (1949): θ² = 0.45 ν/ue⁶ ∫ue⁵ dx, here in closed form; White, Viscous Fluid Flow (1991), eq. 4-139: H = 2 + 4.14 z − 83.5 z² + 854 z³ − 3337 z⁴ + 4576 z⁵ with z = 0.25 − λ.
const NU = 1.5e-5;
const xs = Array.from({ length: 15 }, (_, i) => (0.1 * i) / 14);
const ue = (x: number) => 20 * (1 - x);
const theta = (x: number) => Math.sqrt((0.45 * NU * (1 - (1 - x) ** 6)) / 6 / 20 / (1 - x) ** 6);
function massDefect(x: number): number {
  const z = 0.25 - (theta(x) ** 2 / NU) * -20;
  return ue(x) * theta(x) * (2 + 4.14 * z - 83.5 * z ** 2 + 854 * z ** 3 - 3337 * z ** 4 + 4576 * z ** 5);
}

describe("recalc of a third-party book", () => {
  const { bytes, notes } = recalculate(engine, book);

  it("spills Thwaites' closed form to 1e-9", () => {
    expect(["D3", "E3", "F3", "G3"].map((c) => stored(bytes, WING, c))).toEqual(["station x", "momentum loss θ", "mass defect m", "state"]);
    xs.forEach((x, i) => {
      expect(number(bytes, `D${4 + i}`)).toBeCloseTo(x, 14);
      if (x === 0) return;
      expect(Math.abs(number(bytes, `E${4 + i}`) / theta(x) - 1)).toBeLessThan(1e-9);
      expect(Math.abs(number(bytes, `F${4 + i}`) / massDefect(x) - 1)).toBeLessThan(1e-9);
      expect(number(bytes, `I${3 + i}`)).toBe(number(bytes, `F${4 + i}`));
    });
  });

  it("gives dm/dx within 1 % of the closed form's behind the first third, where one cubic follows m", () => {
    for (let i = 5; i < 14; i++) {
      const h = 1e-5;
      const slope = (massDefect(xs[i]! + h) - massDefect(xs[i]! - h)) / (2 * h);
      expect(Math.abs(number(bytes, `J${3 + i}`) / slope - 1)).toBeLessThan(0.01);
    }
  });

  it("follows names, LET, XLOOKUP, tables, other sheets and Excel's unary minus", () => {
    const sum = xs.reduce((s, _, i) => s + number(bytes, `J${3 + i}`), 0);
    expect(number(bytes, "M3")).toBeCloseTo(sum, 12);
    expect(number(bytes, "M4")).toBe(number(bytes, "E18")); // θ grows along a decelerating flow
    expect(number(bytes, "M5")).toBe(1); // 2ν · 0.5 / ν
    expect(number(bytes, "M6")).toBeCloseTo(18, 12); // ue(0.1)
    expect(number(bytes, "M7")).toBe(24); // (−2)² + 20
    expect(number(bytes, "M8")).toBeCloseTo(20 * Math.sqrt(1.5), 12); // Bernoulli, cp = −0.5
    expect(number(bytes, "M11")).toBe(2);
    expect(number(bytes, "M12")).toBe(36);
    expect(number(bytes, "B1", RUNS)).toBeCloseTo(2 * sum, 12);
    expect(number(bytes, "D3", RUNS)).toBe(36);
    expect(number(bytes, "D4", RUNS)).toBe(14);
  });

  it("keeps what it cannot calculate and says so, cell by cell", () => {
    expect(stored(bytes, WING, "M9")).toBe("42");
    expect(stored(bytes, WING, "M10")).toBe("#VALUE!");
    expect(notes).toEqual([
      { sheet: "Wing", cell: "M9", kind: "left", text: expect.stringMatching(/stored value kept.*CUBEVALUE/) },
      { sheet: "Wing", cell: "M10", kind: "error", text: "#VALUE! EDGE_SPEED needs cp of at most 1; row 1 has 2" },
    ]);
  });

  it("leaves every other part, and in the sheets all but the computed cells, byte for byte", () => {
    const before = unzipSync(book);
    const after = unzipSync(bytes);
    expect(Object.keys(after)).toEqual(Object.keys(before));
    for (const name of Object.keys(before)) {
      if (name === WING || name === RUNS) continue;
      expect(Buffer.from(after[name]!).equals(Buffer.from(before[name]!))).toBe(true);
    }
    const computed = /<c r="(?:[D-G](?:[3-9]|1[0-8])|[IJ](?:[3-9]|1[0-7])|M\d+)"[^>]*?(?:\/>|>.*?<\/c>)/g;
    const ofRuns = /<c r="(?:B1|D3|D4)"[^>]*>.*?<\/c>/g;
    for (const [name, cells] of [[WING, computed], [RUNS, ofRuns]] as const) {
      const old = strFromU8(before[name]!);
      expect(old.match(cells)!.length).toBeGreaterThan(2);
      // Spilled cells that the writer left out are new; everything else must stand as it was.
      expect(strFromU8(after[name]!).replace(cells, "")).toBe(old.replace(cells, ""));
    }
    // Formulas, styles and metadata stay in the computed cells too.
    const formulas = (xml: string) => xml.match(/<f[ >].*?<\/f>/g);
    expect(formulas(strFromU8(after[WING]!))).toEqual(formulas(strFromU8(before[WING]!)));
  });

  it("changes nothing when run again: the very bytes come back", () => {
    expect(Buffer.from(recalculate(engine, bytes).bytes).equals(Buffer.from(bytes))).toBe(true);
    expect(Buffer.from(recalculate(engine, book).bytes).equals(Buffer.from(bytes))).toBe(true);
  });
});

describe("spills that change their size", () => {
  it("shrink: the block's address follows and the cells left over are emptied", () => {
    const full = recalculate(engine, book).bytes;
    const once = recalculate(engine, withSheet(full, (xml) => xml.replace("WALL_THWAITES_MARCH(A4:A18,edge_speeds,", "WALL_THWAITES_MARCH(A4:A14,B4:B14,").replace("WALL_BLOW_VELOCITY(A4:A18", "WALL_BLOW_VELOCITY(A4:A14"))).bytes;
    const xml = strFromU8(unzipSync(once)[WING]!);
    expect(xml).toContain('ref="D3:G14"');
    expect(xml).toContain('ref="I3:I13"');
    expect(xml).toContain('ref="J3:J13"');
    expect(number(once, "E14")).toBeCloseTo(theta(xs[10]!), 12);
    for (const cell of ["D15", "E18", "G16", "I14", "J17"]) expect(stored(once, WING, cell)).toBeUndefined();
    expect(number(once, "M4")).toBe(number(once, "E14"));
    expect(Buffer.from(recalculate(engine, once).bytes).equals(Buffer.from(once))).toBe(true);
    // … and grow again to what they were, in values and addresses.
    const again = recalculate(engine, withSheet(once, (text) => text.replace("WALL_THWAITES_MARCH(A4:A14,B4:B14,", "WALL_THWAITES_MARCH(A4:A18,edge_speeds,").replace("WALL_BLOW_VELOCITY(A4:A14", "WALL_BLOW_VELOCITY(A4:A18"))).bytes;
    const grown = strFromU8(unzipSync(again)[WING]!);
    expect(grown).toContain('ref="D3:G18"');
    for (const cell of ["D18", "E18", "F17", "I17", "J17", "M3"]) expect(stored(again, WING, cell)).toBe(stored(full, WING, cell));
  });

  it("blocked by a cell in their way: an error with a reason, and the cell in the way stays", () => {
    const blocked = withSheet(book, (xml) => xml.replace(/<c r="D9"[^>]*>.*?<\/c>/, '<c r="D9" t="str"><f>"in the way"</f><v>in the way</v></c>'));
    const { bytes, notes } = recalculate(engine, blocked);
    expect(stored(bytes, WING, "D9")).toBe("in the way");
    expect(stored(bytes, WING, "D3")).toBe("#VALUE!");
    expect(notes.find((n) => n.cell === "D3")?.text).toMatch(/^#SPILL!/);
    expect(strFromU8(unzipSync(bytes)[WING]!)).toContain('ref="D3"');
  });
});

function withSheet(bytes: Uint8Array, change: (xml: string) => string): Uint8Array {
  const parts = unzipSync(bytes);
  const old = strFromU8(parts[WING]!);
  const next = change(old);
  if (next === old) throw new Error("The change does not apply.");
  parts[WING] = strToU8(next);
  return zipSync(parts);
}
