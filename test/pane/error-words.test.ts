import { errorWords } from "../../src/pane/error-words";

describe("errors in words", () => {
  test.each([
    ["#VALUE!", "THWAITES_MARCH needs rising x; row 7 (A11) repeats 0.35", "#VALUE!: THWAITES_MARCH needs rising x; row 7 (A11) repeats 0.35"],
    ["#VALUE!", "", "#VALUE!: This host does not pass the reason on; WALL.INPUT_CHECK beside the cell says what is wrong with its inputs."],
    ["#SPILL!", "Result couldn't be automatically expanded.", "#SPILL!: The table needs blank cells below and to the right of its first cell: something stands in the way, or the sheet ends."],
    ["#NAME?", "", "#NAME?: A name in this formula is not known here. If it is a WALL function of an older workbook, enter the formula again."],
  ])("%s with %j", (code, sentence, words) => {
    expect(errorWords({ code, sentence })).toBe(words);
  });
});
