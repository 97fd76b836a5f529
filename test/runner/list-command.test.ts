import { CAUTIONS } from "../../src/cells/cautions";
import { catalogue } from "../../src/cells/generated/catalogue";
import { listCommand } from "../../src/runner/list-command";

describe("wallsheet list", () => {
  it("names every function once, with what it does", () => {
    const { status, out, complaints } = listCommand([]);
    expect([status, complaints]).toEqual([0, []]);
    for (const { name, purpose } of catalogue) expect(out.split("\n").filter((line) => line.trimStart().startsWith(name + " ") && line.endsWith(purpose))).toHaveLength(1);
  });

  it.each(catalogue.map((entry) => [entry.name, entry] as const))("shows the card of %s whole", (name, entry) => {
    const { status, out } = listCommand([name]);
    expect(status).toBe(0);
    for (const p of entry.parameters) for (const text of [p.name, `[${p.unit}]`, p.description]) expect(out).toContain(text);
    for (const text of [entry.purpose, entry.gives, entry.resultUnit, ...entry.limits, ...entry.sources, ...entry.examples.map((e) => e.formula), ...CAUTIONS]) expect(out).toContain(text);
  });

  it("takes a name in any case, with or without the namespace", () => {
    const card = listCommand(["THWAITES_MARCH"]).out;
    for (const name of ["thwaites_march", "wall.thwaites_march", "=WALL.THWAITES_MARCH"]) expect(listCommand([name]).out).toBe(card);
  });

  it.each([
    ["THWAITS", "THWAITES_MARCH"],
    ["thwaites_mrch", "THWAITES_MARCH"],
    ["BLOW", "WALL_BLOW_VELOCITY"],
    ["EDGE_SPED", "EDGE_SPEED"],
  ])("for %s, which does not exist, tells %s", (wrong, right) => {
    expect(listCommand([wrong])).toEqual({ status: 2, out: "", complaints: [`wallsheet: there is no function ${wrong}; the nearest is ${right}`] });
  });

  it("prints JSON that says the same", () => {
    expect(JSON.parse(listCommand(["--json"]).out)).toEqual(catalogue);
    expect(JSON.parse(listCommand(["EDGE_SPEED", "--json"]).out)).toEqual(catalogue.find((e) => e.name === "EDGE_SPEED"));
  });
});
