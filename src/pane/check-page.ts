import { blockAddress } from "./cell-block";
import type { CellFinding, Verdict } from "./check-book";
import { checkBook } from "./check-book";
import { element } from "./element";
import type { SheetHost } from "./sheet-host";

export interface CheckPage {
  readonly root: HTMLElement;
  /** Goes through the book anew. */
  run(): Promise<void>;
}

const MARKS: Record<Verdict, string> = { error: "Error", warning: "Look here", fine: "Fine" };

/** Every WALL cell of the book with what is to be said of it, worst first; each a button that leads to its cell. */
export function checkPage(host: SheetHost, say: (sentence: string, isFault?: boolean) => void): CheckPage {
  const headline = element("p", { class: "wl-headline", role: "status" });
  const list = element("ul", { class: "wl-checks" });
  const again = element("button", { type: "button", class: "wl-minor", click: () => void run().catch((e: unknown) => say(String(e instanceof Error ? e.message : e), true)) }, "Check again");
  const root = element("div", { class: "wl-check" }, element("h2", {}, "Check the book"), headline, again, list);
  let turn = 0;

  async function run(): Promise<void> {
    const mine = ++turn;
    headline.textContent = "Checking …";
    const found = await checkBook(host, (done, of) => {
      if (mine === turn && of > 0 && done < of) headline.textContent = `Checking cell ${done + 1} of ${of} …`;
    });
    if (mine !== turn) return;
    headline.textContent = headlineOf(found);
    const order: Verdict[] = ["error", "warning", "fine"];
    list.replaceChildren(...[...found].sort((a, b) => order.indexOf(a.verdict) - order.indexOf(b.verdict)).map(line));
  }

  function line(finding: CellFinding): HTMLElement {
    const go = element(
      "button",
      { type: "button", class: "wl-entry", click: () => void host.goTo(finding.at).catch((e: unknown) => say(String(e instanceof Error ? e.message : e), true)) },
      element("span", { class: "wl-name" }, blockAddress(finding.at)),
      element("span", { class: "wl-purpose" }, finding.functions.join(" and ")),
      element("span", { class: finding.verdict === "fine" ? "wl-quiet" : "wl-mark" }, MARKS[finding.verdict]),
    );
    return element("li", { class: `wl-verdict-${finding.verdict}` }, go, ...(finding.words.length > 0 ? [element("ul", { class: "wl-notes" }, ...finding.words.map((w) => element("li", {}, w)))] : []));
  }
  return { root, run };
}

function headlineOf(found: readonly CellFinding[]): string {
  if (found.length === 0) return "This book has no WALL cells.";
  const count = (verdict: Verdict) => found.filter((f) => f.verdict === verdict).length;
  const cells = `${found.length} WALL ${found.length === 1 ? "cell" : "cells"}`;
  const [errors, warnings] = [count("error"), count("warning")];
  if (errors + warnings === 0) return `${cells}: nothing to remark.`;
  return `${cells}: ${errors} with an error, ${warnings} to look at, ${found.length - errors - warnings} fine.`;
}
