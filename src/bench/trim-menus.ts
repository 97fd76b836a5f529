import type { GridLibrary, GridMenuItem } from "./grid-library";

/**
 * Menu entries left out of the bench: those that reach out of this machine (pictures, links, maps), those that would change how
 * formulas are read (locale), and those that no workbook file of ours can keep (pivots, carousels, drop-in currencies).
 */
const LEFT_OUT: Readonly<Record<string, readonly string[]>> = {
  topbarMenuRegistry: ["settings", "insert_carousel", "insert_pivot", "insert_image", "insert_link", "pivot_data_sources", "reinsert_dynamic_pivot", "reinsert_static_pivot", "view_irregularity_map"],
  cellMenuRegistry: [
    "insert_link",
    "pivot_headers_group",
    "pivot_group_remaining",
    "pivot_headers_ungroup",
    "collapse_pivot",
    "pivot_sorting",
    "pivot_fix_formulas",
    "pivot_properties",
  ],
  numberFormatMenuRegistry: ["format_number_currency", "format_number_accounting", "format_number_currency_rounded", "format_custom_currency"],
  /** The map draws outlines it would have to fetch. */
  chartSubtypeRegistry: ["geo"],
};

interface MenuRegistry {
  content: Record<string, GridMenuItem>;
}

/** Takes the entries out of the library's registries; throws when one is not there, so that an upgrade is looked at. */
export function trimMenus(library: GridLibrary): void {
  for (const [name, ids] of Object.entries(LEFT_OUT)) {
    const registry = library.registries[name] as MenuRegistry | undefined;
    if (!registry) throw new Error(`The grid library has no ${name}.`);
    for (const id of ids) if (!takeOut(registry, id)) throw new Error(`The grid library's ${name} has no entry ${id}.`);
  }
}

function takeOut(registry: MenuRegistry, id: string): boolean {
  if (Object.hasOwn(registry.content, id)) return delete registry.content[id];
  for (const item of Object.values(registry.content)) {
    const at = item.children?.findIndex((child) => typeof child !== "function" && child.id === id) ?? -1;
    if (at < 0) continue;
    item.children!.splice(at, 1);
    return true;
  }
  return false;
}
