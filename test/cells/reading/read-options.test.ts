import { openCall } from "../../../src/cells/reading/call";
import { readOptions } from "../../../src/cells/reading/read-options";

const call = openCall("THWAITES_MARCH");
const accepted = ["start momentum loss", "edge fit", "noise", "turbulence level", "after separation", "columns"] as const;
const read = (raw: unknown) => readOptions(call, raw, accepted);

test("a block and a text say the same", () => {
  for (const raw of [
    [["Edge fit", "Monotone"], ["start momentum loss", 0.002], [null, null], ["noise", "found"]],
    "edge fit = monotone; START MOMENTUM LOSS = 0.002 m; noise=found;",
  ]) {
    const options = read(raw);
    expect(options.word("edge fit")).toBe("monotone");
    expect(options.number("start momentum loss")).toBe(0.002);
    expect(options.word("noise")).toBe("found");
    expect(options.number("noise")).toBeUndefined();
  }
});

test("a per-cent value is a fraction", () => {
  expect(read("turbulence level = 0.2%").number("turbulence level")).toBeCloseTo(0.002, 15);
  expect(read([["turbulence level", 0.002]]).number("turbulence level")).toBe(0.002);
});

test("columns are named by key, heading or symbol", () => {
  expect(read("columns = station x, θ, shape, blow velocity dm/dx").columns()).toEqual(["station", "momentum_loss", "shape", "blow_velocity"]);
});

test("an option with a blank value keeps its default, and the settings line says so", () => {
  expect(read([["edge fit", null]]).settings({ "edge fit": "spline" })).toBe("edge fit = spline");
});

test.each<[unknown, string]>([
  ["edge fitt = spline", 'THWAITES_MARCH needs options it knows; the text has "edge fitt", nearest is "edge fit"'],
  [[["edge fit", "spline"], ["nois", 1]], 'THWAITES_MARCH needs options it knows; row 2 of options has "nois", nearest is "noise"'],
  ["edge fit = splin", 'needs option "edge fit" to be spline, monotone or smooth; "splin" is none of them, nearest is spline'],
  ["noise = 1; noise = 2", 'needs each option once; the text repeats "noise"'],
  ["edge fit", 'needs options in the form label = value; "edge fit" has no "="'],
  ["start momentum loss = 0.5 mm", 'needs option "start momentum loss" in the sheet\'s own units; "mm" would have to be converted'],
  ["start momentum loss = -1", 'needs option "start momentum loss" of 0 or more; it has -1'],
  ["start momentum loss = 0,5", 'needs a number for option "start momentum loss"; it holds "0,5"'],
  ["turbulence level = 2", "as a fraction or with %; it has 2 (write 2% for 0.02)"],
  ["columns = thetta", 'needs columns it knows; "thetta" is none of them'],
  [[["edge fit", "spline", 3]], "needs options as a block of two columns (label, value) or as text; the range has 3 columns"],
  [[[true, 1], ["noise", 1]], "needs a label in the first column of options; row 1 of options holds TRUE"],
  [[["noise", { code: "#REF!" }]], 'needs a value for option "noise"; it holds #REF!'],
  [12, "needs options as text or as a block of two columns"],
])("%j is refused in one sentence", (raw, sentence) => {
  expect(() => read(raw)).toThrow(sentence);
});
