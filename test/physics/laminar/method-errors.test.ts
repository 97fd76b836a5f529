import { CLASSIC_FLOWS, spaced } from "./classic-flows";
import { marchOf } from "./march-of";
import { methodErrors } from "./method-errors";
import { energyOf, fieldOf, separationStation, wallOf } from "./wall-of";

describe("the laminar methods beside each other on the full solutions (test/references)", () => {
  const rows = methodErrors();
  const of = (method: string) => rows.filter((row) => row.method === method);
  it("cover every method on every flow", () => {
    expect(rows).toHaveLength(12);
  });
  // What the functions' @limits state; a change of these bounds is a change of what users are told.
  it.each([
    ["Thwaites", { momentumLoss: 0.065, defect: 0.018, shape: 0.07, friction: 0.145, separation: 0.029 }],
    ["energy", { momentumLoss: 0.005, defect: 0.0255, shape: 0.026, friction: 0.0605, separation: 0.012 }],
    ["field", { momentumLoss: 1e-4, defect: 1e-4, shape: 1e-4, friction: 4e-4, separation: 1e-4 }],
  ] as const)("%s stays within its stated errors up to nine tenths of the way to separation", (method, limit) => {
    for (const row of of(method)) {
      for (const key of ["momentumLoss", "defect", "shape", "friction"] as const) expect(Math.abs(row.most[key])).toBeLessThan(limit[key]);
      expect(Math.abs(row.separation)).toBeLessThan(limit.separation);
    }
  });
  it("rank as their effort: energy's θ is nearer than Thwaites' on every flow, field's nearer than energy's", () => {
    for (const flow of new Set(rows.map((row) => row.flow))) {
      const [thwaites, energy, field] = ["Thwaites", "energy", "field"].map((method) => Math.abs(rows.find((row) => row.flow === flow && row.method === method)!.most.momentumLoss));
      expect(energy).toBeLessThan(thwaites);
      expect(field).toBeLessThan(energy);
    }
  });
});

describe.each(CLASSIC_FLOWS.map((flow) => [flow.name, flow] as const))("the three marches on ue = %s", (_name, flow) => {
  const separation = separationStation(fieldOf(wallOf(spaced(201, 0, flow.before), spaced(201, 0, flow.before).map(flow.ue))));
  it("agree within 7 % in θ up to nine tenths of the way to separation, energy and field within 1 %", () => {
    const x = spaced(61, 0, 0.9 * separation);
    const ue = x.map(flow.ue);
    const [thwaites, energy, field] = [marchOf(x, ue), energyOf(wallOf(x, ue)), fieldOf(wallOf(x, ue))];
    for (let i = 1; i < 61; i += 1) {
      expect(Math.abs(energy.momentumLoss[i] / field.momentumLoss[i] - 1)).toBeLessThan(1e-2);
      if (i < thwaites.reached) expect(Math.abs(thwaites.momentumLoss[i] / field.momentumLoss[i] - 1)).toBeLessThan(7e-2);
    }
  });
  it("on 15 coarse stations find their own separation again within 0.1 %", () => {
    const fine = spaced(201, 0, flow.before);
    const coarse = spaced(15, 0, 1.1 * separation);
    const energy = separationStation(energyOf(wallOf(fine, fine.map(flow.ue))));
    expect(Math.abs(separationStation(energyOf(wallOf(coarse, coarse.map(flow.ue)))) / energy - 1)).toBeLessThan(1e-3);
    expect(Math.abs(separationStation(fieldOf(wallOf(coarse, coarse.map(flow.ue)))) / separation - 1)).toBeLessThan(1e-3);
  });
});

describe("separation of the field march against the literature", () => {
  // From memory: I. Tani, J. Phys. Soc. Japan 4 (1949) 149–154 by series, three decimals (and as quoted by Curle 1962); R. M. Terrill, Phil. Trans. A 253
  // (1960) 55–100: sin x, 104.45°; D. R. Hartree 1939 and later marches of Howarth's flow: 0.1198.
  it.each([["1 − x (Howarth 1938)", 0.1198, 1e-4], ["1 − x^2 (Tani 1949)", 0.271, 1e-3], ["1 − x^4 (Tani 1949)", 0.462, 1e-3], ["1 − x^8 (Tani 1949)", 0.64, 1e-3], ["sin x", (104.45 * Math.PI) / 180, 5e-4]])(
    "%s: %d",
    (name, printed, digits) => {
      const flow = CLASSIC_FLOWS.find((f) => f.name === name)!;
      const x = spaced(101, 0, flow.before);
      expect(Math.abs(separationStation(fieldOf(wallOf(x, x.map(flow.ue)), 1, { richardson: true })) - printed)).toBeLessThan(digits);
    },
  );
});
