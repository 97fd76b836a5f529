import { catalogue } from "../cells/generated/catalogue";
import { prepareEngine } from "../engine/prepare-engine";
import { wallSheetFunctions } from "../engine/wall-functions";
import { mountPane } from "../pane/mount-pane";
import { installBlockWriter } from "./block-writer";
import { chartMarks } from "./chart-marks";
import { dialogs } from "./dialogs";
import { gridHost } from "./grid-host";
import { pageLibraries, type GridModel } from "./grid-library";
import { mountGrid } from "./mount-grid";
import { starterBook } from "./starter-book";
import { trimMenus } from "./trim-menus";

/** A handle for the browser's console and for tests. */
declare global {
  var wallsheetBench: { model: GridModel } | undefined;
}

async function start(): Promise<void> {
  const { owl, library } = pageLibraries();
  prepareEngine(library, wallSheetFunctions());
  installBlockWriter(library);
  trimMenus(library);
  chartMarks((globalThis as unknown as { Chart: Parameters<typeof chartMarks>[0] }).Chart);
  const model = new library.Model(starterBook());
  await mountGrid(owl, library, model, byId("grid"), dialogs(byId("notice")));
  mountPane(byId("pane"), gridHost(model), catalogue);
  globalThis.wallsheetBench = { model };
}

function byId(id: string): HTMLElement {
  return document.getElementById(id)!;
}

start().catch((error: unknown) => {
  const trouble = byId("trouble");
  trouble.hidden = false;
  trouble.textContent = `The bench did not start. ${error instanceof Error ? error.message : String(error)}`;
  console.error(error);
});
