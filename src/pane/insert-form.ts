import type { CatalogueEntry } from "../cells/catalogue-entry";
import { blockAddress, readAddress, type CellBlock } from "./cell-block";
import { element } from "./element";
import { errorWords } from "./error-words";
import { exampleArguments, formFormula } from "./form-formula";
import { insertTableChart } from "./insert-chart";
import { optionLabels } from "./option-labels";
import { preview, type CallFunction } from "./preview";
import { isBlank, placeBeside, selectedColumns } from "./selected-columns";
import type { HostCell, SheetHost } from "./sheet-host";

/** Typing is over after this many milliseconds. */
const PREVIEW_AFTER = 250;
/** How far to the right of a selection a free place is looked for. */
const COLUMNS_SEARCHED = 60;

export interface InsertForm {
  readonly root: HTMLElement;
  /** Fills arguments and place from what is selected now; called once when the card opens. */
  fill(): Promise<void>;
  /** The selection moved: the place follows it until the user has written one. */
  follow(): Promise<void>;
}

/**
 * The form that inserts one function. It opens with the selected columns in the first arguments, or, when no columns are selected,
 * with the worked example's arguments, so that the inserted formula computes at once. Filled cells are never overwritten.
 */
export function insertForm(entry: CatalogueEntry, host: SheetHost, say: (sentence: string, isFault?: boolean) => void, call?: CallFunction): InsertForm {
  const inputs = entry.parameters.map((p, i) => element("input", { id: `wl-argument-${i}`, type: "text", autocomplete: "off", spellcheck: "false", "aria-describedby": `wl-about-${i}`, "aria-required": String(!p.optional), placeholder: p.optional ? "optional" : "" }));
  const place = element("input", { id: "wl-place", type: "text", autocomplete: "off", spellcheck: "false", class: "wl-place" });
  const formed = element("output", { class: "wl-formula", for: inputs.map((input) => input.id).join(" ") });
  const origin = element("p", { class: "wl-quiet" });
  const shown = element("div", { class: "wl-preview", tabindex: "0", role: "region", "aria-label": "Preview", "aria-live": "polite", hidden: true });
  const withChart = element("input", { id: "wl-with-chart", type: "checkbox" });
  const labels = optionLabels(entry);
  let placeIsWritten = false;
  let turn = 0;

  const showFormed = () => {
    const { formula, missing } = formFormula(entry, inputs.map((input) => input.value));
    formed.textContent = formula ?? `still needed: ${missing.join(", ")}`;
    formed.classList.toggle("wl-unfinished", formula === undefined);
    void showPreview(formula !== undefined);
  };
  async function showPreview(formed: boolean): Promise<void> {
    if (!call) return;
    const mine = ++turn;
    if (!formed) return put();
    await new Promise((resolve) => setTimeout(resolve, PREVIEW_AFTER));
    if (mine !== turn) return;
    const seen = await preview(host, call, entry.name, inputs.map((input) => input.value)).catch((error: unknown) => ({ kind: "fault" as const, words: error instanceof Error ? error.message : String(error) }));
    if (mine !== turn) return;
    if (seen.kind !== "rows") return put(element("p", { class: seen.kind === "fault" ? "wl-fault" : "wl-quiet" }, seen.words));
    const cells = seen.rows.map((row) => element("tr", {}, ...row.map((value) => element("td", { title: String(value ?? "") }, brief(value)))));
    put(element("table", {}, element("caption", {}, seen.of > seen.rows.length ? `Preview: first ${seen.rows.length} of ${seen.of} rows` : "Preview"), ...cells));
  }
  /** Shows a preview; an empty box is no stop for Tab. */
  function put(...nodes: HTMLElement[]): void {
    shown.hidden = nodes.length === 0;
    shown.replaceChildren(...nodes);
  }
  /** A block of option labels beside the place, empty to be filled in, and its address as the argument. */
  async function writeOptions(i: number): Promise<void> {
    const at = readAddress(place.value, (await host.selection()).sheet);
    if (!at) return fault(place, `"${place.value}" is not a cell: write one such as F4.`);
    const block = { ...at, right: at.left + 1, bottom: at.top + labels.length - 1 };
    const there = await host.read(block);
    if (there.some((row) => row.some((cell) => !isBlank(cell)))) return fault(place, `${blockAddress(block, at.sheet)} is not empty: choose a place with two empty columns of ${labels.length} rows.`);
    await host.writeValues({ ...at, right: at.left, bottom: at.top }, labels.map((label) => [label, ""]));
    inputs[i]!.value = blockAddress(block, (await host.selection()).sheet);
    place.value = blockAddress({ ...at, left: at.left + 3, right: at.left + 3, bottom: at.top }, (await host.selection()).sheet);
    placeIsWritten = true;
    showFormed();
    say(`The options stand in ${inputs[i]!.value}: write values beside the labels that matter; an empty one keeps its default.`);
  }
  const clearFault = (input: HTMLInputElement) => input.removeAttribute("aria-invalid");
  const fault = (input: HTMLInputElement, sentence: string) => {
    input.setAttribute("aria-invalid", "true");
    input.focus();
    say(sentence, true);
  };

  async function takeSelection(i: number): Promise<void> {
    const selection = await host.selection();
    const columns = selectedColumns(selection, await host.read(selection));
    const taken = selection.left === selection.right && columns.length === 1 ? columns[0]! : selection;
    inputs[i]!.value = blockAddress(taken, selection.sheet);
    clearFault(inputs[i]!);
    showFormed();
    say(`${entry.parameters[i]!.name} is now ${inputs[i]!.value}`);
  }

  async function insert(): Promise<void> {
    const { formula } = formFormula(entry, inputs.map((input) => input.value));
    if (formula === undefined) {
      const empty = entry.parameters.findIndex((p, i) => !p.optional && inputs[i]!.value.trim() === "");
      return fault(inputs[empty]!, `${entry.parameters[empty]!.name} is still empty: write a number or a range such as A2:A20.`);
    }
    const at = readAddress(place.value, (await host.selection()).sheet);
    if (!at) return fault(place, `"${place.value}" is not a cell: write one such as F4.`);
    const target = { ...at, right: at.left, bottom: at.top };
    const address = blockAddress(target, target.sheet);
    if (!isBlank((await host.read(target))[0]?.[0])) return fault(place, `${address} is not empty: choose an empty cell.`);
    await host.writeFormula(target, formula);
    await host.goTo(target);
    const cell = (await host.read(target))[0]?.[0];
    if (!cell?.error && withChart.checked && !(await insertTableChart(host, target, entry.name))) return say(`${entry.name} stands in ${address}; it has no columns to draw.`);
    if (cell?.error) say(`${address} shows ${errorWords(cell.error)}`, true);
    else say(`${entry.name} stands in ${address}.`);
  }

  const attempt = (action: () => Promise<void>) => () => void action().catch((error: unknown) => say(error instanceof Error ? error.message : String(error), true));

  const rows = entry.parameters.map((p, i) => {
    inputs[i]!.addEventListener("input", () => {
      clearFault(inputs[i]!);
      showFormed();
    });
    return element(
      "div",
      { class: "wl-argument" },
      element("label", { for: inputs[i]!.id }, element("span", { class: "wl-name" }, p.name), " ", element("span", { class: "wl-unit" }, `[${p.unit}]`)),
      element("div", { class: "wl-field" }, inputs[i]!, element("button", { type: "button", class: "wl-minor", "aria-label": `Use the selection for ${p.name}`, title: "Use the selected cells", click: attempt(() => takeSelection(i)) }, "Selection")),
      element("p", { id: `wl-about-${i}`, class: "wl-quiet" }, p.description),
      ...(p.name === "options" && labels.length > 0 ? [element("button", { type: "button", class: "wl-minor", click: attempt(() => writeOptions(i)) }, "Write a settings block into the sheet")] : []),
    );
  });
  place.addEventListener("input", () => {
    placeIsWritten = place.value.trim() !== "";
    clearFault(place);
  });

  const root = element(
    "form",
    { class: "wl-insert", "aria-label": `Insert ${entry.name}`, novalidate: true },
    element("h3", {}, "Arguments"),
    origin,
    ...rows,
    element("h3", {}, "Formula"),
    formed,
    shown,
    element("p", { class: "wl-field" }, element("label", { for: "wl-with-chart" }, withChart, " with a chart beside its table")),
    element("div", { class: "wl-field wl-go" }, element("label", { for: "wl-place" }, "into cell"), place, element("button", { type: "submit", class: "wl-major" }, "Insert")),
  );
  root.addEventListener("submit", (event) => {
    event.preventDefault();
    attempt(insert)();
  });

  async function fill(): Promise<void> {
    const selection = await host.selection();
    const cells = await host.read(selection);
    const columns = selectedColumns(selection, cells).slice(0, entry.parameters.filter((p) => !p.optional).length);
    const values = columns.length > 0 ? columns.map((column) => blockAddress(column, selection.sheet)) : exampleArguments(entry);
    inputs.forEach((input, i) => (input.value = values[i] ?? ""));
    origin.textContent =
      columns.length > 0
        ? "Filled from the selected columns; complete the rest."
        : values.some((value) => value !== "")
          ? "Filled with a worked example; put your own cells in its place."
          : "Write numbers, or ranges such as A2:A20.";
    showFormed();
    await follow();
  }

  async function follow(): Promise<void> {
    if (placeIsWritten) return;
    const selection = await host.selection();
    place.value = blockAddress(await freePlace(host, selection), selection.sheet);
    clearFault(place);
  }

  return { root, fill, follow };
}

/** The selection's own cell when it is one blank cell; otherwise the nearest free place to its right. */
async function freePlace(host: SheetHost, selection: CellBlock): Promise<CellBlock> {
  const cells: readonly (readonly HostCell[])[] = await host.read(selection);
  const single = selection.left === selection.right && selection.top === selection.bottom;
  if (single && isBlank(cells[0]?.[0])) return selection;
  const beside = { ...selection, left: selection.right + 1, right: selection.right + COLUMNS_SEARCHED, bottom: selection.top };
  return placeBeside(selection, (await host.read(beside))[0] ?? []);
}

/** A value as a narrow preview shows it. */
function brief(value: HostCell["value"]): string {
  if (typeof value !== "number") return value === null ? "" : String(value);
  return value === 0 || (Math.abs(value) >= 1e-3 && Math.abs(value) < 1e5) ? String(Number(value.toPrecision(4))) : value.toExponential(2);
}
