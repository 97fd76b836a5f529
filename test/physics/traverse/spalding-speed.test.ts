import { KARMAN, LOG_CONSTANT, spaldingSpeed } from "../../../src/physics/traverse/spalding-speed";
import { numbers, readReference } from "../../references/read-reference";

test("the speed satisfies Spalding's formula (1961) itself", () => {
  for (const yPlus of [1e-3, 0.1, 1, 5, 12, 30, 100, 1e3, 1e5]) {
    const u = spaldingSpeed(yPlus);
    const x = KARMAN * u;
    const back = u + Math.exp(-KARMAN * LOG_CONSTANT) * (Math.exp(x) - 1 - x - x ** 2 / 2 - x ** 3 / 6);
    expect(back / yPlus - 1).toBeCloseTo(0, 9);
  }
  expect(spaldingSpeed(0)).toBe(0);
});

test("it joins the sublayer and the logarithmic law", () => {
  expect(spaldingSpeed(0.5)).toBeCloseTo(0.5, 4);
  expect(spaldingSpeed(1e6)).toBeCloseTo(Math.log(1e6) / KARMAN + LOG_CONSTANT, 2);
});

test("it follows the tabulated law of the NASA turbulence-model resource to its printed digits, with Spalding's own constants", () => {
  const rows = readReference("tmr_spalding.csv");
  const yPlus = numbers(rows, "log10_yplus").map((v) => 10 ** v);
  numbers(rows, "uplus").forEach((u, i) => expect(Math.abs(spaldingSpeed(yPlus[i]!, 0.4, 5.5) / u - 1)).toBeLessThan(2e-5));
});
