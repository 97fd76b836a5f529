import type { EngineCell, EngineGetters, EngineLibrary, EngineModel, EnginePosition, EngineZone } from "../engine/types";

/** The parts of the grid library that only a page uses (@odoo/o-spreadsheet 19.3.7), typed by hand like those of the engine room. */
export interface GridModel extends EngineModel {
  getters: EngineGetters & { getSelectedZone(): EngineZone; getCells(sheetId: string): EngineCell[]; getCellPosition(cellId: number): EnginePosition };
  on(type: "update", owner: object, listener: () => void): void;
  off(type: "update", owner: object): void;
  exportData(): Record<string, unknown>;
  session: { getRevisionId(): string };
  selection: {
    selectZone(anchor: { cell: { col: number; row: number }; zone: EngineZone }): unknown;
  };
}

export interface GridMenuItem {
  id?: string;
  children?: (GridMenuItem | ((env: unknown) => unknown))[];
}

export interface GridLibrary extends EngineLibrary {
  Model: new (data?: unknown, config?: unknown) => GridModel;
  Spreadsheet: unknown;
  /** Base of plugins; `dispatch` inside `handle` makes sub-commands. */
  UIPlugin: new (config: unknown) => { dispatch(command: string, payload: Record<string, unknown>): unknown };
  /** Makes the data form out of an .xlsx file's parts. */
  load(parts: Record<string, string>): Record<string, unknown>;
  DEFAULT_LOCALES: unknown[];
}

/** @odoo/owl 2.8.3. */
export interface OwlLibrary {
  App: new (component: unknown, config: unknown) => { mount(target: HTMLElement): Promise<unknown>; destroy(): void; root?: { props: Record<string, unknown> } };
}

/** What the library files before ours have put on the page's globalThis. */
export function pageLibraries(): { owl: OwlLibrary; library: GridLibrary } {
  const { owl, o_spreadsheet: library } = globalThis as unknown as { owl?: OwlLibrary; o_spreadsheet?: GridLibrary };
  if (!owl || !library) throw new Error("The grid library did not load; build again with `npm run build`.");
  return { owl, library };
}
