import { readFileSync } from "node:fs";
import { COMPILED_NAMES } from "../../src/engine/compile-shape";
import { NOT_COMPUTED } from "../../src/engine/not-computed";
import { preparedEngine } from "./prepared-engine";

const listed = readFileSync("test/references/common-functions.txt", "utf8")
  .split("\n")
  .filter((line) => line !== "" && !line.startsWith("#"))
  .flatMap((line) => line.replace(/^[^:]*:/, "").trim().split(/\s+/));
const known = new Set([...Object.keys(preparedEngine().library.registries.functionRegistry.content), ...COMPILED_NAMES]);

describe("the functions engineers use", () => {
  it("are at least 350, each listed once", () => {
    expect(new Set(listed).size).toBe(listed.length);
    expect(listed.length).toBeGreaterThanOrEqual(350);
  });

  it.each(listed)("%s is calculated here, or stands in the list of those that are not", (name) => {
    expect(known.has(name) || Object.hasOwn(NOT_COMPUTED, name)).toBe(true);
  });

  it("leave few of them to Excel", () => {
    expect(listed.filter((name) => Object.hasOwn(NOT_COMPUTED, name)).sort()).toEqual(["AREAS", "CELL", "ISREF", "SHEET", "SHEETS"]);
  });
});
