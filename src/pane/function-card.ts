import type { CatalogueEntry } from "../cells/catalogue-entry";
import { element } from "./element";
import { callPattern } from "./form-formula";
import { insertForm, type InsertForm } from "./insert-form";
import type { CallFunction } from "./preview";
import type { SheetHost } from "./sheet-host";

export interface FunctionCard {
  readonly root: HTMLElement;
  readonly form: InsertForm;
  focus(): void;
}

/** All there is to know of one function, and the form that inserts it. */
export function functionCard(entry: CatalogueEntry, host: SheetHost, back: () => void, say: (sentence: string, isFault?: boolean) => void, call?: CallFunction): FunctionCard {
  const title = element("h2", { class: "wl-title", tabindex: "-1" }, entry.name);
  const form = insertForm(entry, host, say, call);
  const root = element(
    "article",
    { class: "wl-card", "aria-label": entry.name },
    element("button", { type: "button", class: "wl-back", click: back }, "‹ All functions"),
    title,
    element("p", { class: "wl-quiet wl-family-of" }, entry.family),
    element("p", {}, entry.purpose),
    element("p", { class: "wl-formula" }, callPattern(entry)),
    element("p", {}, element("a", { href: `help/${entry.name}.html`, target: "_blank", rel: "noopener" }, "Help page with equations")),
    form.root,
    fact("Gives", [withUnit(entry.gives, entry.resultUnit)]),
    fact("Valid range and error", entry.limits),
    fact("Source", entry.sources),
    element(
      "section",
      {},
      element("h3", {}, "Example"),
      ...entry.examples.flatMap((e) => [element("p", { class: "wl-formula" }, e.formula), element("p", { class: "wl-value" }, `gives ${String(e.value)}`)]),
    ),
  );
  root.addEventListener("keydown", (event) => {
    if (event.key !== "Escape") return;
    event.preventDefault();
    back();
  });
  return { root, form, focus: () => title.focus() };
}

function withUnit(sentence: string, unit: string): string {
  return unit === "" || unit === "text" ? sentence : `${sentence.replace(/\.$/, "")} [${unit}].`;
}

function fact(heading: string, lines: readonly string[]): HTMLElement {
  const content = lines.length === 1 ? element("p", {}, lines[0]!) : element("ul", {}, ...lines.map((line) => element("li", {}, line)));
  return element("section", {}, element("h3", {}, heading), content);
}
