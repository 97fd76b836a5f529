import project from "../../package.json";
import { CAUTIONS } from "../cells/cautions";
import { catalogue } from "../cells/generated/catalogue";
import { wallFunctions } from "../cells/generated/functions";
import { tableRemarks } from "../cells/reading/table-remarks";
import { prepareEngine } from "../engine/prepare-engine";
import { wallSheetFunctions } from "../engine/wall-functions";
import { mountPane } from "../pane/mount-pane";
import { plainCopy } from "../workbook/plain-copy";
import { readWorkbook } from "../workbook/read-workbook";
import { installBlockWriter } from "./block-writer";
import { bookBar } from "./book-bar";
import { chartMarks } from "./chart-marks";
import { dialogs } from "./dialogs";
import { gridHost } from "./grid-host";
import { pageLibraries, type GridModel } from "./grid-library";
import { forgetBook, keepBook, keptBook } from "./kept-book";
import { mountGrid } from "./mount-grid";
import { readBook } from "./read-book";
import { starterBook } from "./starter-book";
import { trimMenus } from "./trim-menus";
import { writeBook } from "./write-book";

/** A handle for the browser's console and for tests. */
declare global {
  var wallsheetBench: { model: GridModel } | undefined;
}

const STARTER = "starter.xlsx";
/** The book is put into the browser's storage this long after a change, so that a row of edits costs one writing. */
const KEEP_AFTER_MILLISECONDS = 1500;
const FILE_TYPE = "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";

async function start(): Promise<void> {
  const { owl, library } = pageLibraries();
  prepareEngine(library, wallSheetFunctions());
  installBlockWriter(library);
  trimMenus(library);
  chartMarks((globalThis as unknown as { Chart: Parameters<typeof chartMarks>[0] }).Chart);
  const speak = dialogs(byId("notice"));
  const bar = bookBar({ open: (file) => void open(file), save: () => void save(), plainCopy: () => void savePlain(), starter: () => replaceBook(() => showStarter()), empty: () => replaceBook(() => show({}, "book.xlsx")) });
  byId("bar").replaceWith(bar.root);

  let model!: GridModel;
  let name = STARTER;
  /** Revision that a file holds, or the book as it came. */
  let saved = "";
  let storedIn = true;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let close = (): void => {};
  const isChanged = () => model.session.getRevisionId() !== saved;
  const tell = (text: string, sticky = false) => speak.notifyUser({ text, sticky });

  async function show(data: Record<string, unknown>, file: string, changed = false): Promise<void> {
    // The model first: a book that the grid refuses leaves the old one standing.
    const next = new library.Model(data);
    close();
    model = next;
    name = file;
    saved = changed ? "" : model.session.getRevisionId();
    const app = await mountGrid(owl, library, model, byId("grid"), speak);
    const host = gridHost(model);
    const pane = mountPane(byId("pane"), host, catalogue, {
      call: (called, args) => wallFunctions[called]!(...args, {}),
      plainCopy: savePlain,
      books: [
        { name: "Starter book", words: "invented scenarios: a glider's wing section from taps to drag, three laminar marches, a hull plate", open: () => replaceBook(() => showStarter()) },
        { name: "Empty book", words: "one empty sheet", open: () => replaceBook(() => show({}, "book.xlsx")) },
      ],
    });
    const owner = {};
    model.on("update", owner, follow);
    close = () => {
      model.off("update", owner);
      pane.close();
      app.destroy();
      byId("grid").replaceChildren();
    };
    globalThis.wallsheetBench = { model };
    bar.show(name, isChanged());
  }
  let followed = "";
  function follow(): void {
    const revision = model.session.getRevisionId();
    if (revision === followed) return;
    followed = revision;
    bar.show(name, isChanged());
    clearTimeout(timer);
    timer = setTimeout(keep, KEEP_AFTER_MILLISECONDS);
  }
  function keep(): void {
    if (!isChanged()) return;
    const kept = keepBook(localStorage, { name, data: model.exportData() });
    if (!kept && storedIn) tell("The browser's storage is full: this book is no longer kept there. Save it as a file.", true);
    storedIn = kept;
  }
  async function showStarter(): Promise<void> {
    await show(starterBook(), STARTER);
  }

  /** Does what replaces the book, after asking where changes would go. */
  function replaceBook(then: () => Promise<void>): void {
    const go = () => {
      forgetBook(localStorage);
      then().catch(trouble);
    };
    if (isChanged()) speak.askConfirmation(`${name} has changes that no file holds. Go on without them?`, go);
    else go();
  }
  async function open(file: File): Promise<void> {
    try {
      const { data, lost } = readBook(library, new Uint8Array(await file.arrayBuffer()));
      replaceBook(async () => {
        await show(data, file.name);
        if (lost.length > 0) tell(`${file.name} is open. When it is saved here it will be without: ${lost.join(", ")}. Keep the original.`, true);
        else tell(`${file.name} is open.`);
      });
    } catch (error) {
      speak.raiseError(`${file.name} could not be opened. ${words(error)}`);
    }
  }
  async function save(): Promise<void> {
    try {
      const revision = model.session.getRevisionId();
      await give(await writeBook(model), name.replace(/\.xlsm$/i, ".xlsx"));
      saved = revision;
      forgetBook(localStorage);
      keepBook(localStorage, { name, data: model.exportData() });
      bar.show(name, isChanged());
    } catch (error) {
      speak.raiseError(`The book could not be saved. ${words(error)}`);
    }
  }
  async function savePlain(): Promise<void> {
    try {
      const copy = plainCopy(readWorkbook(await writeBook(model)), {
        methods: catalogue,
        version: project.version,
        date: today(),
        cautions: CAUTIONS,
        remarks: (_cell, values) => {
          const { beyond, notes } = tableRemarks(values);
          return { warnings: beyond, notes };
        },
      });
      if (copy.cells.length === 0) return tell("This book has no WALL cells: a plain copy is the book itself.");
      await give(copy.bytes, name.replace(/(\.xls[xm])?$/i, "-plain.xlsx"));
      tell(`${copy.cells.length} WALL cells are values in the copy; how they were calculated stands in its sheet "${copy.notesSheet}".`);
    } catch (error) {
      speak.raiseError(`The plain copy could not be made. ${words(error)}`);
    }
  }
  async function give(bytes: Uint8Array, file: string): Promise<void> {
    await gridHost(model).saveFile!(file, new Blob([bytes as BlobPart], { type: FILE_TYPE }));
  }
  function trouble(error: unknown): void {
    speak.raiseError(words(error));
  }

  addEventListener("beforeunload", (event) => {
    if (isChanged() && !storedIn) event.preventDefault();
    else keep();
  });
  addEventListener("dragover", (event) => {
    if (event.dataTransfer?.types.includes("Files")) event.preventDefault();
  });
  addEventListener("drop", (event) => {
    const file = event.dataTransfer?.files[0];
    if (!file) return;
    event.preventDefault();
    void open(file);
  });

  const kept = keptBook(localStorage);
  if (kept === undefined) await showStarter();
  else {
    try {
      await show(kept.data, kept.name, true);
      tell(`${kept.name} as it was left in this browser.`);
    } catch (error) {
      console.error(error);
      await showStarter();
      tell("The book that was left in this browser could not be read; this is the starter book.", true);
    }
  }
}

/** The day where the user is. */
function today(): string {
  const now = new Date();
  return `${now.getFullYear()}-${String(now.getMonth() + 1).padStart(2, "0")}-${String(now.getDate()).padStart(2, "0")}`;
}

function words(error: unknown): string {
  return error instanceof Error ? error.message : String(error);
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
