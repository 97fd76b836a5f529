import { axisFrame } from "../../src/chart/axis-frame";
import { linePath, lineRuns, markedPoints } from "../../src/chart/line-path";

const frame = axisFrame([0, 10], "linear", [0, 100], 4);

test("a line goes straight from place to place", () => {
  expect(linePath(lineRuns([0, 1, 3], [0, 2, 4], frame, frame))).toBe("M0,0L10,20L30,40");
});

test("a blank is a gap, never bridged and never drawn as zero", () => {
  const runs = lineRuns([0, 1, 2, 3, 4], [1, 1, null, 5, 5], frame, frame);
  expect(runs.map((run) => run.map((p) => p.row))).toEqual([[0, 1], [3, 4]]);
  expect(linePath(runs)).toBe("M0,10L10,10M30,50L40,50");
  expect(lineRuns([0, null, 2], [1, 1, 1], frame, frame)).toHaveLength(2);
});

test("a log axis has a gap where a value is not above zero", () => {
  const log = axisFrame([1, 100], "log", [0, 200], 4);
  expect(lineRuns([0, 1, 2, 3], [1, 0, 10, 100], frame, log).map((run) => run.map((p) => p.py))).toEqual([[0], [100, 200]]);
});

test("a value that stands alone has no line but always its mark", () => {
  const runs = lineRuns([0, 1, 2], [1, null, 3], frame, frame);
  expect(linePath(runs)).toBe("");
  expect(markedPoints(runs, 1000).map((p) => p.row)).toEqual([0, 2]);
});

test("marks on a dense line keep their distance", () => {
  const x = Array.from({ length: 101 }, (_, i) => i / 10);
  const marked = markedPoints(lineRuns(x, x.map(() => 5), frame, frame), 20);
  expect(marked.map((p) => p.px)).toEqual([0, 20, 40, 60, 80, 100]);
});
