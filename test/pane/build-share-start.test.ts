import { catalogue } from "../../src/cells/generated/catalogue";
import { wallFunctions } from "../../src/cells/generated/functions";
import { OPTION_VOCABULARY } from "../../src/cells/reading/option-vocabulary";
import type { CellBlock } from "../../src/pane/cell-block";
import { optionLabels } from "../../src/pane/option-labels";
import { preview, type CallFunction } from "../../src/pane/preview";
import { methodNotes } from "../../src/pane/share-page";
import type { HostCell, SheetHost } from "../../src/pane/sheet-host";
import { writeTemplate } from "../../src/pane/start-page";
import { TEMPLATES } from "../../src/pane/templates";

const call: CallFunction = (name, args) => (wallFunctions[name] as (...given: unknown[]) => unknown)(...args, {});

/** One sheet in memory with a selection; formulas are kept apart. */
function hostOf(selection: Partial<CellBlock> = {}): SheetHost & { cells: Map<string, HostCell["value"]>; formulas: Map<string, string> } {
  const cells = new Map<string, HostCell["value"]>();
  const formulas = new Map<string, string>();
  const refuse = async (): Promise<never> => {
    throw new Error("not asked for here");
  };
  return {
    cells,
    formulas,
    name: "a test",
    selection: async () => ({ sheet: "Data", left: 0, top: 0, right: 0, bottom: 0, ...selection }),
    read: async (b) =>
      Array.from({ length: b.bottom - b.top + 1 }, (_, r) =>
        Array.from({ length: b.right - b.left + 1 }, (_, c) => {
          const value = cells.get(`${b.left + c},${b.top + r}`) ?? null;
          return { value, text: String(value ?? "") };
        }),
      ),
    writeFormula: async (at, formula) => void formulas.set(`${at.left},${at.top}`, formula),
    writeValues: async (at, rows) => rows.forEach((row, r) => row.forEach((v, c) => cells.set(`${at.left + c},${at.top + r}`, v))),
    insertChart: refuse,
    wallCells: refuse,
    tableAt: refuse,
    goTo: refuse,
    whenChanged: () => () => {},
  };
}

describe("the preview of a formula being built", () => {
  it("reads ranges from the sheet, takes constants as they stand, and shows the first rows", async () => {
    const host = hostOf();
    [-1, 0, 0.75, 1].forEach((cp, i) => host.cells.set(`0,${i}`, cp));
    expect(await preview(host, call, "EDGE_SPEED", ["A1:A4", "10", ""])).toEqual({ kind: "rows", rows: [[10 * Math.SQRT2], [10], [5], [0]].map((r) => r.map((v) => expect.closeTo(v, 9))), of: 4 });
    expect(await preview(host, call, "EDGE_SPEED", ["{1;0.75}", "1e1", ""])).toMatchObject({ rows: [[0], [5]] });
  });
  it("says a function's sentence, and that an argument of another formula has no preview", async () => {
    expect(await preview(hostOf(), call, "EDGE_SPEED", ["{2}", "10", ""])).toMatchObject({ kind: "fault", words: expect.stringContaining("EDGE_SPEED needs cp of at most 1") });
    expect(await preview(hostOf(), call, "EDGE_SPEED", ["SORT(A1:A4)", "10", ""])).toMatchObject({ kind: "none" });
    expect(await preview(hostOf(), call, "EDGE_SPEED", ["{1;x}", "10", ""])).toMatchObject({ kind: "none" });
  });
  it("shows every function's own example arguments without a fault of ours", async () => {
    for (const entry of catalogue) {
      const args = entry.parameters.map(() => "");
      const seen = await preview(hostOf(), call, entry.name, args);
      expect(["fault", "rows"]).toContain(seen.kind);
      if (seen.kind === "fault") expect(seen.words).toMatch(new RegExp(`^${entry.name} needs`));
    }
  });
});

describe("the settings block", () => {
  it("has the labels a function takes, known ones only, for every function with options", () => {
    const takers = catalogue.filter((e) => e.parameters.some((p) => p.name === "options"));
    expect(takers.length).toBeGreaterThan(6);
    for (const entry of takers) {
      const labels = optionLabels(entry);
      expect(labels.length).toBeGreaterThan(0);
      for (const label of labels) expect(Object.keys(OPTION_VOCABULARY)).toContain(label);
      expect(new Set(labels).size).toBe(labels.length);
    }
    expect(optionLabels(catalogue.find((e) => e.name === "LAYER_MARCH")!)).toEqual([
      "onset", "onset criterion", "turbulence level", "trip momentum loss", "transition zone", "laminar method", "turbulent method", "start momentum loss", "start shape", "reference Mach", "reference speed", "gamma", "edge fit", "noise", "after separation", "columns",
    ]);
    expect(optionLabels(catalogue.find((e) => e.name === "EDGE_SPEED")!)).toEqual([]);
  });
  it("is accepted by the function as it stands, all values empty: defaults hold", () => {
    for (const name of ["LAYER_MARCH", "LAG_MARCH", "THWAITES_MARCH", "FIELD_MARCH"]) {
      const entry = catalogue.find((e) => e.name === name)!;
      const x = [[0], [0.5], [1]];
      const ue = [[20], [20], [20]];
      const rest = entry.parameters.slice(4).map(() => null);
      expect(call(name, [x, ue, 1e-6, optionLabels(entry).map((label) => [label, ""]), ...rest])).toEqual(call(name, [x, ue, 1e-6, null, ...rest]));
    }
  });
});

describe("method notes", () => {
  it("name formula, limits, sources and cautions of every WALL cell", () => {
    const rows = methodNotes([{ at: { sheet: "Data", left: 3, top: 4, right: 3, bottom: 4 }, formula: "=WALL.EDGE_SPEED(A1:A4,10)" }], catalogue)!;
    expect(rows[0]).toEqual(["cell", "item", "text"]);
    expect(rows[1]).toEqual(["Data!D5", "formula", "WALL.EDGE_SPEED(A1:A4,10)"]);
    const entry = catalogue.find((e) => e.name === "EDGE_SPEED")!;
    for (const text of [...entry.limits, ...entry.sources]) expect(rows.some((r) => r[2] === text)).toBe(true);
    expect(rows.at(-1)![1]).toBe("caution");
    expect(methodNotes([], catalogue)).toBeUndefined();
  });
});

describe("templates", () => {
  it.each(TEMPLATES.map((t) => [t.name, t] as const))("%s is written from the selected cell on and computes", async (_name, template) => {
    const host = hostOf({ left: 2, top: 3, right: 2, bottom: 3 });
    expect(await writeTemplate(host, template)).toContain("stands in C4:");
    expect(host.cells.get("2,3")).toMatch(/^Invented numbers/);
    const [[place, formula]] = [...host.formulas];
    expect(place).toBe(`${2 + template.formulas[0]!.column},${3 + template.formulas[0]!.row}`);
    const [, name, inside] = /^=WALL\.([A-Z_]+)\((.*)\)$/.exec(formula!)!;
    const written = inside!.split(",");
    const seen = await preview(host, call, name!, catalogue.find((e) => e.name === name)!.parameters.map((_, i) => written[i] ?? ""));
    expect(seen).toMatchObject({ kind: "rows" });
  });
  it("never overwrite filled cells", async () => {
    const host = hostOf();
    host.cells.set("1,2", 5);
    await expect(writeTemplate(host, TEMPLATES[0]!)).rejects.toThrow("is not empty: select a cell with room below");
  });
});
