import { loadHeadless } from "../../src/engine/load-headless";

const root = process.cwd();

describe("loadHeadless", () => {
  it("gives the pinned version of the library, which calculates and spills", () => {
    const library = loadHeadless(root);
    expect(library.__info__.version).toBe("19.3.7");
    const model = new library.Model({ sheets: [{ id: "s", name: "Sheet1", rowNumber: 20, colNumber: 5, cells: { A1: "2", A2: "=A1*3", A3: "=SEQUENCE(2)" } }] });
    const at = (row: number) => model.getters.getEvaluatedCell({ sheetId: "s", col: 0, row }).value;
    expect([at(1), at(2), at(3)]).toEqual([6, 1, 2]);
  });

  it("plants no page on the real globalThis", () => {
    loadHeadless(root);
    for (const name of ["document", "DOMParser", "OffscreenCanvas", "owl", "o_spreadsheet"]) expect(name in globalThis).toBe(false);
  });

  it("names the missing file and where it looked", () => {
    expect(() => loadHeadless("/nowhere")).toThrow(/owl\.iife\.min\.js is neither in \/nowhere nor in/);
  });
});
