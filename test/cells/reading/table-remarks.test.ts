import { tableRemarks } from "../../../src/cells/reading/table-remarks";
import { thwaitesMarch } from "../../../src/cells/laminar/thwaites-march";

describe("tableRemarks", () => {
  it("collects notes with their stations, and each run of states beyond the method", () => {
    const table = [
      ["station x", "state", "note"],
      [0, "laminar", "Thwaites"],
      [0.1, "separated", "laminar separation"],
      [0.2, "separated", ""],
      [0.3, "laminar", null],
      [0.4, "out of range", ""],
    ];
    expect(tableRemarks(table)).toEqual({
      notes: ["at 0: Thwaites", "at 0.1: laminar separation"],
      beyond: ["separated in rows 3 to 4 of its block, from station x 0.1", "out of range in row 6 of its block, from station x 0.4"],
    });
  });

  it.each<[string, unknown[][]]>([
    ["a number", [[5]]],
    ["an error", [[{ error: "#N/A" }]]],
    ["a column of words", [["laminar"], ["separated"]]],
    ["nothing", []],
    ["a table without state and note", [["station x", "Re θ"], [0, 1]]],
  ])("has nothing to say of %s", (_what, table) => expect(tableRemarks(table)).toEqual({ notes: [], beyond: [] }));

  it("needs no station, and knows the words of a march", () => {
    expect(tableRemarks([["state", "note"], ["lifted off", "blown off"]])).toEqual({ notes: ["blown off"], beyond: ["lifted off in row 2 of its block"] });
    const x = Array.from({ length: 8 }, (_, i) => [i / 40]);
    const spilled = thwaitesMarch(x, x.map(([v]) => [1 - v!]), 1e-5, null as never, null as never, {} as never);
    // Thwaites on 1 − x separates at 0.123: of the stations 0, 0.025, … the sixth (0.125) is the first behind it.
    expect(tableRemarks(spilled).beyond).toEqual(["separated in rows 7 to 9 of its block, from station x 0.125"]);
  });
});
