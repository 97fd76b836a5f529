import { CAUTIONS } from "../cells/cautions";
import type { CatalogueEntry } from "../cells/catalogue-entry";
import { element } from "./element";
import { functionCard, type FunctionCard } from "./function-card";
import { functionList } from "./function-list";
import { checkPage } from "./check-page";
import { lookPage } from "./look-page";
import type { CallFunction } from "./preview";
import { selectedCell } from "./selected-cell";
import { sharePage, type ShareActions } from "./share-page";
import type { SheetHost } from "./sheet-host";
import { startPage, type StarterBook } from "./start-page";

export interface Pane {
  /** Opens a function's card by its name without namespace; an unknown name shows the list. */
  open(name: string): void;
  /** Takes the pane out of the page and ends its listening. */
  close(): void;
}

/** What a host's page adds to the pane. */
export interface PaneExtras extends ShareActions {
  /** Calls a compiled function, for previews; none are shown without it. */
  call?: CallFunction;
  /** Books to begin with. */
  books?: readonly StarterBook[];
}

/** Builds the pane inside `root` (its style sheet is pane.css) and lets it follow the host's selection. */
export function mountPane(root: HTMLElement, host: SheetHost, catalogue: readonly CatalogueEntry[], extras: PaneExtras = {}): Pane {
  const status = element("p", { class: "wl-status", role: "status" });
  const say = (sentence: string, isFault = false) => {
    status.textContent = sentence;
    status.classList.toggle("wl-fault", isFault);
  };
  const complain = (error: unknown) => say(error instanceof Error ? error.message : String(error), true);

  const body = element("div", { class: "wl-body" });
  let card: FunctionCard | undefined;
  const list = functionList(catalogue, (entry) => showCard(entry), say);
  const cell = selectedCell(catalogue, host, (entry) => showCard(entry));

  const openByName = (name: string) => {
    const entry = catalogue.find((e) => e.name === name);
    if (entry) showCard(entry);
    else showList();
  };
  const look = lookPage(host, openByName, say);
  const check = checkPage(host, say);
  const share = sharePage(host, catalogue, extras, say);
  const startWith = startPage(host, extras.books ?? [], say);
  const pages = {
    Find: () => body.replaceChildren(card?.root ?? list.root),
    Look: () => body.replaceChildren(look.root),
    Check: () => body.replaceChildren(check.root),
    Share: () => body.replaceChildren(share),
    Start: () => body.replaceChildren(startWith),
  };
  let page: keyof typeof pages = "Find";
  const tabs = (Object.keys(pages) as (keyof typeof pages)[]).map((name) => element("button", { type: "button", class: "wl-tab", click: () => turnTo(name) }, name));
  function turnTo(name: keyof typeof pages): void {
    page = name;
    for (const tab of tabs) {
      if (tab.textContent === name) tab.setAttribute("aria-current", "page");
      else tab.removeAttribute("aria-current");
    }
    say("");
    cell.root.hidden = name === "Look"; // it tells its table itself
    pages[name]();
    body.scrollTop = 0;
    if (name === "Look") look.update().catch(complain);
    if (name === "Check") check.run().catch(complain);
  }

  function showCard(entry: CatalogueEntry): void {
    const shown = functionCard(entry, host, () => showList(entry.name), say, extras.call);
    card = shown;
    turnTo("Find");
    shown.focus();
    shown.form.fill().catch(complain);
  }
  function showList(name?: string): void {
    card = undefined;
    turnTo("Find");
    list.focusOn(name);
  }
  const update = () => {
    cell.update().catch(complain);
    if (page === "Look") look.update().catch(complain);
    else card?.form.follow().catch(complain);
  };

  turnTo("Find");
  root.classList.add("wl-pane");
  root.replaceChildren(
    element("div", { class: "wl-header" }, element("h1", {}, "Wallsheet"), element("span", { class: "wl-quiet" }, `functions in ${host.name}`)),
    element("nav", { class: "wl-tabs", "aria-label": "Pages of the pane" }, ...tabs),
    cell.root,
    body,
    status,
    element("aside", { class: "wl-cautions", "aria-label": "Cautions" }, ...CAUTIONS.map((caution) => element("p", {}, caution))),
  );
  const stop = host.whenChanged(update);
  update();
  return {
    open: openByName,
    close() {
      stop();
      root.replaceChildren();
      root.classList.remove("wl-pane");
    },
  };
}
