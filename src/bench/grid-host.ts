import { excelErrorCode } from "../engine/engine-values";
import type { EngineEvaluatedCell, EnginePosition, EngineZone } from "../engine/types";
import { blockAddress, type CellBlock } from "../pane/cell-block";
import { element } from "../pane/element";
import { calledFunctions } from "../pane/form-formula";
import type { ChartRequest, HostCell, HostValue, SheetHost, WallCell } from "../pane/sheet-host";
import { typedContent, WRITE_CELLS } from "./block-writer";
import { chartFigure } from "./chart-figure";
import type { GridModel } from "./grid-library";

/** The pane's view of the grid. */
export function gridHost(model: GridModel): SheetHost {
  const getters = model.getters;

  function sheetId(name: string): string {
    const found = getters.getSheetIds().find((id) => getters.getSheetName(id) === name);
    if (found === undefined) throw new Error(`There is no sheet "${name}" in this book.`);
    return found;
  }
  const first = (block: CellBlock): EnginePosition => ({ sheetId: sheetId(block.sheet), col: block.left, row: block.top });
  const blockOf = (id: string, zone: EngineZone): CellBlock => ({ sheet: getters.getSheetName(id), left: zone.left, top: zone.top, right: zone.right, bottom: zone.bottom });
  const zoneOf = ({ left, top, right, bottom }: CellBlock): EngineZone => ({ left, top, right, bottom });

  function cellAt(at: EnginePosition): HostCell {
    const evaluated = getters.getEvaluatedCell(at);
    const formula = formulaAt(at);
    const source = getters.getArrayFormulaSpreadingOn(at);
    const spilledFrom = source && (source.col !== at.col || source.row !== at.row) ? blockOf(at.sheetId, { left: source.col, right: source.col, top: source.row, bottom: source.row }) : undefined;
    const error = errorOf(evaluated);
    return { value: error ? null : (evaluated.value as HostValue), text: evaluated.formattedValue, ...(formula !== undefined && { formula }), ...(error && { error }), ...(spilledFrom && { spilledFrom }) };
  }
  function formulaAt(at: EnginePosition): string | undefined {
    const cell = getters.getCell(at);
    return cell?.isFormula ? (cell.compiledFormula?.toFormulaString(getters) ?? cell.content) : undefined;
  }
  function wallCellAt(at: EnginePosition): WallCell | undefined {
    const formula = formulaAt(at);
    if (formula === undefined || calledFunctions(formula).length === 0) return undefined;
    const own = { left: at.col, right: at.col, top: at.row, bottom: at.row };
    const error = errorOf(getters.getEvaluatedCell(at));
    return { at: blockOf(at.sheetId, own), formula, spill: blockOf(at.sheetId, getters.getSpreadZone(at) ?? own), ...(error && { error }) };
  }
  function command(name: string, payload: Record<string, unknown>, sentence: string): void {
    const { isSuccessful, reasons } = model.dispatch(name, payload);
    if (!isSuccessful) throw new Error(`${sentence} (${reasons.join(", ")}).`);
  }

  return {
    name: "the bench",

    async selection() {
      return blockOf(getters.getActiveSheetId(), getters.getSelectedZone());
    },

    async read(block) {
      const id = sheetId(block.sheet);
      const right = Math.max(block.left, Math.min(block.right, getters.getNumberCols(id) - 1));
      const bottom = Math.max(block.top, Math.min(block.bottom, getters.getNumberRows(id) - 1));
      if (block.left >= getters.getNumberCols(id) || block.top >= getters.getNumberRows(id)) return [[{ value: null, text: "" }]];
      const rows: HostCell[][] = [];
      for (let row = block.top; row <= bottom; row++) {
        const cells: HostCell[] = [];
        for (let col = block.left; col <= right; col++) cells.push(cellAt({ sheetId: id, col, row }));
        rows.push(cells);
      }
      return rows;
    },

    async writeFormula(at, formula) {
      command("UPDATE_CELL", { ...first(at), content: formula }, `The formula could not be written into ${blockAddress(at)}`);
    },

    async writeValues(at, rows) {
      const { sheetId: id, col, row } = first(at);
      const width = Math.max(0, ...rows.map((values) => values.length));
      if (col + width > getters.getNumberCols(id) || row + rows.length > getters.getNumberRows(id)) throw new Error(`The values do not fit on the sheet at ${blockAddress(at)}.`);
      const cells = rows.flatMap((values, r) => values.map((value, c) => ({ col: col + c, row: row + r, content: typedContent(value) })));
      command(WRITE_CELLS, { sheetId: id, cells }, `The values could not be written at ${blockAddress(at)}`);
    },

    async insertChart(chart: ChartRequest) {
      const id = sheetId(chart.at.sheet);
      const figure = chartFigure(chart, `chart-${Date.now().toString(36)}`);
      command("CREATE_CHART", { sheetId: id, figureId: figure.id, chartId: figure.data.chartId, col: figure.col, row: figure.row, offset: figure.offset, size: { width: figure.width, height: figure.height }, definition: figure.data }, "The chart could not be drawn");
    },

    async wallCells() {
      const found: WallCell[] = [];
      for (const id of getters.getSheetIds()) {
        const formulas = getters.getCells(id).filter((cell) => cell.isFormula).map((cell) => getters.getCellPosition(cell.id));
        for (const at of formulas.sort((a, b) => a.row - b.row || a.col - b.col)) {
          const cell = wallCellAt(at);
          if (cell) found.push(cell);
        }
      }
      return found;
    },

    async tableAt(at) {
      const place = first(at);
      return wallCellAt(getters.getArrayFormulaSpreadingOn(place) ?? place);
    },

    async saveFile(name, content) {
      const link = element("a", { href: URL.createObjectURL(content), download: name });
      link.click();
      // The browser has taken the file by the time the next task runs.
      setTimeout(() => URL.revokeObjectURL(link.href), 0);
    },

    async goTo(block) {
      const id = sheetId(block.sheet);
      const active = getters.getActiveSheetId();
      if (id !== active) command("ACTIVATE_SHEET", { sheetIdFrom: active, sheetIdTo: id }, `The sheet ${block.sheet} could not be shown`);
      model.selection.selectZone({ cell: { col: block.left, row: block.top }, zone: zoneOf(block) });
    },

    whenChanged(listener) {
      const owner = {};
      let waiting = false;
      model.on("update", owner, () => {
        if (waiting) return; // one call for all updates before the next frame
        waiting = true;
        requestAnimationFrame(() => {
          waiting = false;
          listener();
        });
      });
      return () => model.off("update", owner);
    },
  };
}

function errorOf(cell: EngineEvaluatedCell): HostCell["error"] {
  if (cell.type !== "error") return undefined;
  return { code: excelErrorCode(String(cell.value)), sentence: String(cell.message ?? "") };
}
