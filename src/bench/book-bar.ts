import { element } from "../pane/element";

export interface BookBar {
  readonly root: HTMLElement;
  /** Shows the book's name and whether it has changes that no file holds. */
  show(name: string, unsaved: boolean): void;
}

export interface BookActions {
  open(file: File): void;
  save(): void;
  plainCopy(): void;
  starter(): void;
  empty(): void;
}

/** The strip over the grid: which book this is, and what can be done with it as a whole. */
export function bookBar(actions: BookActions): BookBar {
  const name = element("span", { class: "bench-name" });
  const picker = element("input", { type: "file", accept: ".xlsx,.xlsm", hidden: true, "aria-label": "Workbook file", change: () => void pick() });
  const button = (words: string, title: string, click: () => void) => element("button", { type: "button", title, click }, words);
  const root = element(
    "header",
    { id: "bench-bar" },
    name,
    button("Open …", "Open an .xlsx workbook from this machine; it can also be dropped on the page", () => picker.click()),
    button("Save", "Save the book as an .xlsx file", actions.save),
    button("Plain copy", "Save a copy with values in place of WALL cells and a sheet of method notes, for readers without Wallsheet", actions.plainCopy),
    button("Starter book", "Open the starter book with its invented scenarios", actions.starter),
    button("Empty book", "Begin an empty book", actions.empty),
    picker,
  );
  function pick(): void {
    const file = picker.files?.[0];
    picker.value = "";
    if (file) actions.open(file);
  }
  return {
    root,
    show(book, unsaved) {
      name.textContent = unsaved ? `${book} (changed)` : book;
      document.title = `${unsaved ? "* " : ""}${book} – Wallsheet bench`;
    },
  };
}
