/**
 * A stand-in for the parts of Excel's API the host uses. It is strict where Excel is: a property may be read only after it was
 * loaded and synced, writes take effect at sync, unknown sheets fail at sync, a batch counts its round trips.
 */
export interface StandInCell {
  value: unknown;
  formula?: string;
  spilledFrom?: string;
  spillsTo?: string;
  isError?: boolean;
}

export class StandInBook {
  /** Set by Office.addin.setStartupBehavior. */
  startup: string | undefined;
  sheets = new Map<string, Map<string, StandInCell>>();
  selected = { sheet: "Sheet1", address: "A1" };
  several = false;
  syncs = 0;
  charts: { sheet: string; title: string; x: string[]; values: string[]; names: string[]; at: string }[] = [];
  handlers = new Set<() => Promise<void>>();
  editing = false;

  cell(sheet: string, address: string): StandInCell | undefined {
    return this.sheets.get(sheet)?.get(address);
  }
}

const letters = (n: number): string => (n < 0 ? "" : letters(Math.floor(n / 26) - 1) + String.fromCharCode(65 + (n % 26)));
const number = (s: string) => [...s].reduce((a, c) => a * 26 + c.charCodeAt(0) - 64, 0) - 1;
const corners = (address: string) => {
  const m = /^(?:.*!)?([A-Z]+)(\d+)(?::([A-Z]+)(\d+))?$/.exec(address)!;
  return { left: number(m[1]!), top: +m[2]! - 1, right: number(m[3] ?? m[1]!), bottom: +(m[4] ?? m[2]!) - 1 };
};
const failure = (code: string) => Object.assign(new Error(code), { code });

/** Puts the stand-in where Excel's globals are. */
export function installStandIn(book: StandInBook): void {
  const run = async (first: unknown, second?: (context: unknown) => Promise<unknown>) => {
    const work = (second ?? first) as (context: unknown) => Promise<unknown>;
    return work(second ? first : contextOf(book)); // Excel.run(context, work) goes on in that context
  };
  // Which start-up behaviour a book was given; Excel keeps it in the file.
  const Office = {
    context: { requirements: { isSetSupported: (set: string) => set === "SharedRuntime" } },
    addin: { setStartupBehavior: async (behaviour: string) => void (book.startup = behaviour) },
    StartupBehavior: { load: "Load", none: "None" },
  };
  Object.assign(globalThis, { Office, Excel: { run, ChartType: { xyscatterLinesNoMarkers: "XYScatterLinesNoMarkers" }, ChartSeriesBy: { columns: "Columns" } } });
}

function contextOf(book: StandInBook) {
  const queue: (() => void)[] = [];
  /** An object whose listed properties can be read only after load and sync. */
  function loadable<T extends object>(name: string, read: () => Record<string, unknown>, members: T): T {
    const asked = new Set<string>();
    let known: Record<string, unknown> = {};
    return new Proxy(members, {
      get(target, key: string) {
        if (key in target) return (target as Record<string, unknown>)[key];
        if (key === "load") {
          return (what: string) => {
            for (const part of what.split(",")) asked.add(part.trim().split("/")[0]!);
            queue.push(() => {
              const all = read();
              known = { ...known, isNullObject: all["isNullObject"] ?? false, ...Object.fromEntries([...asked].map((k) => [k, all[k]])) };
            });
          };
        }
        if (key in known) return known[key];
        throw new Error(`The property '${key}' of ${name} is not available: load it and call context.sync() first.`);
      },
      set(target, key: string, value: unknown) {
        (target as Record<string, unknown>)[`set:${key}`] = value;
        queue.push(() => (target as unknown as { write?: (key: string, value: unknown) => void }).write?.(key, value));
        return true;
      },
    });
  }
  const rangeOf = (sheet: string, address: string): object => {
    const box = () => corners(address);
    const cells = () => {
      const cellsOf = book.sheets.get(sheet);
      if (!cellsOf) throw failure("ItemNotFound");
      const { left, top, right, bottom } = box();
      return Array.from({ length: bottom - top + 1 }, (_, r) => Array.from({ length: right - left + 1 }, (_, c) => cellsOf.get(letters(left + c) + (top + r + 1))));
    };
    const worksheet = loadable("Worksheet", () => ({ name: sheet }), {});
    return loadable(
      "Range",
      () => ({
        address: `${/^\w+$/.test(sheet) ? sheet : `'${sheet}'`}!${address}`,
        values: cells().map((row) => row.map((cell) => cell?.value ?? "")),
        text: cells().map((row) => row.map((cell) => String(cell?.value ?? ""))),
        formulas: cells().map((row) => row.map((cell) => cell?.formula ?? cell?.value ?? "")),
        valueTypes: cells().map((row) => row.map((cell) => (cell?.isError ? "Error" : cell === undefined || cell.value === "" ? "Empty" : typeof cell.value === "number" ? "Double" : "String"))),
      }),
      {
        worksheet,
        address_: address,
        select: () => queue.push(() => (book.selected = { sheet, address })),
        getSpillParentOrNullObject: () => loadable("Range", () => (cells()[0]![0]?.spilledFrom ? { address: `${sheet}!${cells()[0]![0]!.spilledFrom}` } : { isNullObject: true }), {}),
        getSpillingToRangeOrNullObject: () => loadable("Range", () => (cells()[0]![0]?.spillsTo ? { address: `${sheet}!${cells()[0]![0]!.spillsTo}` } : { isNullObject: true }), {}),
        write(key: string, value: unknown) {
          if (book.editing) throw failure("InvalidOperationInCellEditMode");
          const { left, top } = box();
          (value as unknown[][]).forEach((row, r) => row.forEach((v, c) => book.sheets.get(sheet)!.set(letters(left + c) + (top + r + 1), key === "formulas" ? { value: "…", formula: String(v) } : { value: v })));
        },
      },
    );
  };
  const sheetOf = (name: string): object =>
    loadable("Worksheet", () => ({ name }), {
      name_: name,
      activate: () => queue.push(() => void (book.selected.sheet = name)),
      getRange: (address: string) => rangeOf(name, address),
      getCell: (row: number, column: number) => rangeOf(name, letters(column) + (row + 1)),
      getUsedRangeOrNullObject: () => {
        const used = () => {
          const cells = book.sheets.get(name);
          if (!cells) throw failure("ItemNotFound");
          if (cells.size === 0) return undefined;
          const all = [...cells.keys()].map(corners);
          const m = (k: "left" | "top", f: (...v: number[]) => number) => f(...all.map((b) => b[k]));
          return `${letters(m("left", Math.min))}${m("top", Math.min) + 1}:${letters(m("left", Math.max))}${m("top", Math.max) + 1}`;
        };
        return new Proxy({} as Record<string, unknown>, {
          get(target, key: string) {
            if (key === "load") return (what: string) => void (queue.push(() => void (target["range"] = used() ? rangeOf(name, used()!) : undefined)), queue.push(() => target["range"] && (target["range"] as { load(w: string): void }).load(what)), queue.push(() => queue.splice(0).forEach((f) => f())));
            if (key === "isNullObject") return target["range"] === undefined;
            return (target["range"] as Record<string, unknown>)[key];
          },
        });
      },
      charts: {
        add: (_type: string, _range: object) => {
          const chart = { sheet: name, title: "", x: [] as string[], values: [] as string[], names: [] as string[], at: "" };
          queue.push(() => book.charts.push(chart));
          const series = () => ({
            set name(text: string) { queue.push(() => chart.names.push(text)); },
            setValues: (r: { address_: string }) => queue.push(() => chart.values.push(r.address_)),
            setXAxisValues: (r: { address_: string }) => queue.push(() => chart.x.push(r.address_)),
          });
          const axis = () => ({ title: { text: "" } });
          return {
            title: { set text(text: string) { queue.push(() => (chart.title = text)); } },
            axes: { categoryAxis: axis(), valueAxis: axis() },
            series: { getItemAt: series, add: series },
            setPosition: (r: { address_: string }) => queue.push(() => (chart.at = r.address_)),
          };
        },
      },
    });
  const event = { add: (handler: () => Promise<void>) => (queue.push(() => book.handlers.add(handler)), { context, remove: () => queue.push(() => book.handlers.delete(handler)) }) };
  const context = {
    workbook: {
      getSelectedRange: () => {
        if (book.several) queue.push(() => { throw failure("InvalidSelection"); });
        return rangeOf(book.selected.sheet, book.selected.address);
      },
      onSelectionChanged: event,
      worksheets: loadable("WorksheetCollection", () => ({ items: [...book.sheets.keys()].map((name) => Object.assign(Object.create(null) as object, { name, getUsedRangeOrNullObject: (sheetOf(name) as { getUsedRangeOrNullObject: unknown }).getUsedRangeOrNullObject, getCell: (sheetOf(name) as { getCell: unknown }).getCell })) }), {
        getItem: sheetOf,
        onChanged: event,
        onCalculated: event,
      }),
    },
    sync: async () => {
      book.syncs++;
      for (const action of queue.splice(0)) action();
    },
  };
  return context;
}
