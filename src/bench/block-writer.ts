import type { GridLibrary } from "./grid-library";

/** Our own command: many cells in one undoable step, on any sheet. */
export const WRITE_CELLS = "WALLSHEET_WRITE_CELLS";

export interface CellContent {
  readonly col: number;
  readonly row: number;
  /** As typed into the cell. */
  readonly content: string;
}

const NAME = "wallsheet_block_writer";

/**
 * Teaches the grid library the command (19.3.7: what a plugin dispatches while it handles a command belongs to that command's undo
 * step). Models made afterwards know it.
 */
export function installBlockWriter(library: GridLibrary): void {
  const registry = library.registries.featurePluginRegistry as { content: Record<string, unknown>; add(name: string, plugin: unknown): unknown };
  if (Object.hasOwn(registry.content, NAME)) return;
  registry.add(
    NAME,
    class extends library.UIPlugin {
      handle(command: { type: string; sheetId?: string; cells?: readonly CellContent[] }): void {
        if (command.type !== WRITE_CELLS) return;
        for (const { col, row, content } of command.cells!) this.dispatch("UPDATE_CELL", { sheetId: command.sheetId, col, row, content });
      }
    },
  );
}

/** A plain value as typed: text that would be read as something else gets the mark that keeps it text. Text that is exactly an error code stays one. */
export function typedContent(value: number | string | boolean | null): string {
  if (value === null) return "";
  if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
  if (typeof value === "number") return String(value);
  const readAsOther = /^['=+\-@]/.test(value) || /^(TRUE|FALSE)$/i.test(value) || /^[\d.,]/.test(value);
  return readAsOther ? "'" + value : value;
}
