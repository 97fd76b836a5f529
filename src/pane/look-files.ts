import { chartColumn } from "../chart/chart-column";
import { chartLayout } from "../chart/chart-layout";
import { chartSvg } from "../chart/chart-svg";
import { svgText } from "../chart/svg-node";
import { element } from "./element";
import type { LookPanel } from "./look-panels";
import type { LookTable } from "./look-table";
import { picturePng } from "./picture-png";
import type { SheetHost } from "./sheet-host";
import { tableCsv } from "./table-csv";

/** What is shown now, for files of it. */
export interface Shown {
  /** Begins the files' names. */
  readonly name: string;
  readonly table: LookTable;
  readonly panels: readonly LookPanel[];
}

/** Width and plot height of a chart that leaves the pane; with its margins it fills a page's column of 720 px. */
const WIDTH = 696;
const PLOT_HEIGHT = 220;

type Say = (sentence: string, isFault?: boolean) => void;

/** Buttons that save the table as CSV and the charts as SVG or PNG where the host gives out files, and copy them everywhere. */
export function lookFiles(host: SheetHost, shown: () => Shown | undefined, say: Say): HTMLElement {
  const refused = element("div", {});
  const kinds = {
    CSV: async (now: Shown) => new Blob([tableCsv(now.table.headings, now.table.cells)], { type: "text/csv" }),
    SVG: async (now: Shown) => new Blob([picture(now).text], { type: "image/svg+xml" }),
    PNG: async (now: Shown) => {
      const { text, width, height } = picture(now);
      return picturePng(text, width, height);
    },
  };
  const attempt = (work: (now: Shown) => Promise<void>) => () => {
    const now = shown();
    refused.replaceChildren();
    if (now) work(now).catch((error: unknown) => say(error instanceof Error ? error.message : String(error), true));
  };
  const button = (words: string, work: (now: Shown) => Promise<void>) => element("button", { type: "button", class: "wl-minor", click: attempt(work) }, words);
  const each = Object.entries(kinds) as [keyof typeof kinds, (now: Shown) => Promise<Blob>][];
  const { saveFile } = host;
  const save = saveFile
    ? each.map(([kind, make]) =>
        button(`Save ${kind}`, async (now) => {
          const file = `${now.name}.${kind.toLowerCase()}`;
          await saveFile.call(host, file, await make(now));
          say(`${file} is handed to the browser.`);
        }),
      )
    : [];
  const copy = each.map(([kind, make]) => button(`Copy ${kind}`, async (now) => copyOut(kind, await make(now), refused, say)));
  return element("section", { "aria-label": "Files" }, element("h3", {}, saveFile ? "Save or copy what is shown" : "Copy what is shown"), ...(save.length > 0 ? [element("div", { class: "wl-files" }, ...save)] : []), element("div", { class: "wl-files" }, ...copy), refused);
}

function picture({ panels }: Shown): { text: string; width: number; height: number } {
  const drawn = panels.map((panel, i) => chartSvg(panel.chart, chartLayout(panel.chart, WIDTH, PLOT_HEIGHT), `chart-${i}`, true));
  const all = chartColumn(drawn);
  return { text: svgText(all), width: Number(all.attributes.width), height: Number(all.attributes.height) };
}

/** To the clipboard; where the host refuses it, the thing itself is put into the page to be taken by hand. */
async function copyOut(kind: string, content: Blob, refused: HTMLElement, say: Say): Promise<void> {
  const isPicture = content.type === "image/png";
  try {
    if (isPicture) await navigator.clipboard.write([new ClipboardItem({ [content.type]: content })]);
    else await navigator.clipboard.writeText(await content.text());
    say(`The ${kind} is copied.`);
  } catch (error) {
    if (isPicture) {
      const address = URL.createObjectURL(content);
      const shown = element("img", { src: address, alt: "The charts as a picture", class: "wl-picture" });
      shown.addEventListener("load", () => URL.revokeObjectURL(address));
      refused.replaceChildren(shown);
      say(`Copying was refused (${reason(error)}). The picture stands below the buttons: copy or save it from its own menu.`, true);
      return;
    }
    const field = element("textarea", { class: "wl-copy", readonly: true, rows: "6", "aria-label": `The ${kind} as text` });
    field.value = await content.text();
    refused.replaceChildren(field);
    field.focus();
    field.select();
    say(`Copying was refused (${reason(error)}). The text stands selected below the buttons: press Ctrl+C, or ⌘C.`, true);
  }
}

function reason(error: unknown): string {
  return error instanceof Error ? error.message.replace(/\.$/, "") : String(error);
}
