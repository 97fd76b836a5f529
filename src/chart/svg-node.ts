/** A piece of SVG as plain data: it becomes text in Node and elements in a page. */
export interface SvgNode {
  readonly tag: string;
  readonly attributes: Readonly<Record<string, string | number>>;
  readonly children: readonly (SvgNode | string)[];
}

const SVG = "http://www.w3.org/2000/svg";

export function svg(tag: string, attributes: SvgNode["attributes"] = {}, ...children: readonly (SvgNode | string)[]): SvgNode {
  return { tag, attributes, children };
}

/** The piece as text; the outermost element names its namespace, so that the text stands as a file of its own. */
export function svgText(node: SvgNode, outermost = true): string {
  const attributes = Object.entries({ ...(outermost ? { xmlns: SVG } : {}), ...node.attributes }).map(([name, value]) => ` ${name}="${escaped(String(value))}"`);
  const inside = node.children.map((child) => (typeof child === "string" ? escaped(child) : svgText(child, false))).join("");
  return `<${node.tag}${attributes.join("")}>${inside}</${node.tag}>`;
}

/** The piece as elements of a page; text stays text, whatever a cell holds. */
export function svgElement(node: SvgNode, page: Document): SVGElement {
  const made = page.createElementNS(SVG, node.tag);
  for (const [name, value] of Object.entries(node.attributes)) made.setAttribute(name, String(value));
  made.append(...node.children.map((child) => (typeof child === "string" ? child : svgElement(child, page))));
  return made;
}

/** Marks of the language escaped, characters that XML has no place for left out. */
function escaped(text: string): string {
  return text
    .replace(/[^\t\n\r\u{20}-\u{D7FF}\u{E000}-\u{FFFD}\u{10000}-\u{10FFFF}]/gu, "")
    .replace(/[&<>"]/g, (c) => `&#${c.charCodeAt(0)};`);
}
