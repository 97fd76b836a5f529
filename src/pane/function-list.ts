import type { CatalogueEntry } from "../cells/catalogue-entry";
import { element } from "./element";
import { findFunctions } from "./find-functions";

export interface FunctionList {
  readonly root: HTMLElement;
  /** Puts the focus on a function's button, or on the search field when it is not listed. */
  focusOn(name?: string): void;
}

/** The catalogue by family with a search field over it. `say` reports the number found. */
export function functionList(catalogue: readonly CatalogueEntry[], open: (entry: CatalogueEntry) => void, say: (sentence: string) => void): FunctionList {
  const results = element("div", { class: "wl-results" });
  const search = element("input", { id: "wl-search", type: "search", autocomplete: "off", spellcheck: "false", placeholder: "θ, separation, Thwaites …" });
  const buttons = () => [...results.querySelectorAll<HTMLButtonElement>("button")];

  const show = () => {
    const found = findFunctions(catalogue, search.value);
    results.replaceChildren(...groups(found, search.value.trim() === "").map(([family, entries]) => familySection(family, entries, open)));
    if (found.length === 0) results.append(element("p", { class: "wl-quiet" }, "No function has all of these words. Try fewer, or a symbol such as θ or cf."));
  };
  search.addEventListener("input", () => {
    show();
    const count = buttons().length;
    say(count === 1 ? "1 function" : `${count} functions`);
  });

  const root = element(
    "div",
    { class: "wl-find" },
    element("div", { class: "wl-searchbar", role: "search" }, element("label", { for: "wl-search" }, "Find a function"), search),
    results,
  );
  root.addEventListener("keydown", (event) => {
    const list = buttons();
    const at = list.indexOf(event.target as HTMLButtonElement);
    if (event.key === "Enter" && event.target === search && list.length > 0 && search.value.trim() !== "") {
      event.preventDefault();
      list[0]!.click();
    } else if (event.key === "ArrowDown" && (event.target === search || at >= 0)) {
      event.preventDefault();
      list[at + 1]?.focus();
    } else if (event.key === "ArrowUp" && at >= 0) {
      event.preventDefault();
      (list[at - 1] ?? search).focus();
    } else if (event.key === "Escape" && event.target === search && search.value !== "") {
      event.preventDefault();
      search.value = "";
      search.dispatchEvent(new Event("input"));
    }
  });
  show();
  return {
    root,
    focusOn: (name) => (buttons().find((button) => button.dataset.name === name) ?? search).focus(),
  };
}

/** In the catalogue's families when everything is listed; a search keeps its own order, best first. */
function groups(entries: readonly CatalogueEntry[], byFamily: boolean): [string, CatalogueEntry[]][] {
  if (!byFamily) return entries.length > 0 ? [["Found", [...entries]]] : [];
  const families = new Map<string, CatalogueEntry[]>();
  for (const entry of entries) families.set(entry.family, [...(families.get(entry.family) ?? []), entry]);
  return [...families];
}

function familySection(family: string, entries: readonly CatalogueEntry[], open: (entry: CatalogueEntry) => void): HTMLElement {
  const items = entries.map((entry) =>
    element(
      "li",
      {},
      element(
        "button",
        { type: "button", class: "wl-entry", "data-name": entry.name, click: () => open(entry) },
        element("span", { class: "wl-name" }, entry.name),
        element("span", { class: "wl-purpose" }, entry.purpose),
      ),
    ),
  );
  return element("section", { "aria-label": family }, element("h2", { class: "wl-family" }, family), element("ul", { class: "wl-entries" }, ...items));
}
