import fc from "fast-check";
import { logTickWords, numberWords, tickWords } from "../../src/chart/number-words";

test.each([
  [0, "0"],
  [-0, "0"],
  [0.0003123456, "0.0003123"],
  [0.5, "0.5"],
  [-12.5, "−12.5"],
  [2.5911, "2.591"],
  [1000, "1000"],
  [123456, "123\u202f500"],
  [1250000, "1\u202f250\u202f000"],
  [9.99999e-5, "0.0001"],
  [0.00002445, "0.00002445"],
  [9.99999e-6, "10⁻⁵"],
  [0.000003123, "3.123×10⁻⁶"],
  [-1e-7, "−10⁻⁷"],
  [2.5e8, "2.5×10⁸"],
  [1e-12, "10⁻¹²"],
])("%p reads %s", (value, words) => {
  expect(numberWords(value)).toBe(words);
});

test("a reading says the number to half a unit of its fourth digit, whatever its size", () => {
  fc.assert(
    fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e20, max: 1e20 }), (value) => {
      const back = readBack(numberWords(value));
      expect(Math.abs(back - value)).toBeLessThanOrEqual(0.5001e-3 * Math.abs(value) + Number.MIN_VALUE);
      expect(numberWords(value)).not.toMatch(/e|NaN|-/);
    }),
  );
});

test("marks of one axis share one form", () => {
  expect(tickWords([0, 0.00005, 0.0001, 0.00015], 0.00005)).toEqual(["0", "0.00005", "0.00010", "0.00015"]);
  expect(tickWords([-2, 0, 2], 2)).toEqual(["−2", "0", "2"]);
  expect(tickWords([0, 2.5, 5], 2.5)).toEqual(["0", "2.5", "5.0"]);
  expect(tickWords([0, 2e-7, 4e-7], 2e-7)).toEqual(["0", "2×10⁻⁷", "4×10⁻⁷"]);
  expect(tickWords([0, 50000, 100000], 50000)).toEqual(["0", "50\u202f000", "100\u202f000"]);
  expect(tickWords([0, 5e6, 1e7], 5e6)).toEqual(["0", "5×10⁶", "10⁷"]);
});

test("marks of a log axis are plain numbers while they read well", () => {
  expect(logTickWords([0.00001, 0.001, 0.02, 1, 500, 1e6])).toEqual(["0.00001", "0.001", "0.02", "1", "500", "1\u202f000\u202f000"]);
  expect(logTickWords([1e-6, 1e7])).toEqual(["10⁻⁶", "10⁷"]);
});

function readBack(words: string): number {
  const plain = words.replaceAll("−", "-").replaceAll("\u202f", "");
  const [digits, power] = plain.includes("×") ? plain.split("×10") : plain.startsWith("10⁻") || /^-?10[⁰¹²³⁴⁵⁶⁷⁸⁹⁻]/.test(plain) ? [plain.startsWith("-") ? "-1" : "1", plain.replace(/^-?10/, "")] : [plain, ""];
  const exponent = [...(power ?? "")].map((c) => (c === "⁻" ? "-" : String("⁰¹²³⁴⁵⁶⁷⁸⁹".indexOf(c)))).join("");
  return Number(`${digits}e${exponent || "0"}`);
}
