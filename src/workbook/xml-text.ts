/** Text and attributes of the XML parts of a workbook; parts with a document type are refused before they come here. */

const ENTITIES: Readonly<Record<string, string>> = { lt: "<", gt: ">", amp: "&", quot: '"', apos: "'" };

/** Text content → characters, the workbook's own `_x000D_` escapes included. */
export function plainText(xml: string): string {
  return plainXml(xml).replace(/_x([0-9A-F]{4})_/gi, (_, hex: string) => String.fromCharCode(parseInt(hex, 16)));
}

/** Entities only, as in attributes and formulas. */
export function plainXml(xml: string): string {
  return xml.replace(/&(#x[0-9a-f]+|#[0-9]+|[a-z]+);/gi, (whole, entity: string) => {
    if (entity[0] !== "#") return ENTITIES[entity] ?? whole;
    const code = entity[1] === "x" || entity[1] === "X" ? parseInt(entity.slice(2), 16) : Number(entity.slice(1));
    return code <= 0x10ffff ? String.fromCodePoint(code) : whole;
  });
}

/** Characters → text content. Control characters get the workbook's escape, and text that looks like one is kept apart from it. */
export function xmlText(text: string): string {
  return text
    .replace(/_(?=x[0-9A-F]{4}_)/gi, "_x005F_")
    .replace(/[&<>]/g, (c) => (c === "&" ? "&amp;" : c === "<" ? "&lt;" : "&gt;"))
    .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g, (c) => `_x${c.charCodeAt(0).toString(16).padStart(4, "0").toUpperCase()}_`);
}

/** Attributes of a start tag's inside by name. */
export function attributes(inside: string): Record<string, string> {
  const found: Record<string, string> = {};
  for (const m of inside.matchAll(/([\w:.-]+)\s*=\s*(?:"([^"]*)"|'([^']*)')/g)) found[m[1]!] = plainXml(m[2] ?? m[3] ?? "");
  return found;
}

/** One element found in a part. */
export interface XmlElement {
  attributes: Record<string, string>;
  /** What stands between start and end tag, as written. */
  inside: string;
  at: number;
  length: number;
}

/** All elements of a name, with any prefix; elements of one name must not be nested in each other. */
export function elements(xml: string, name: string): XmlElement[] {
  const pattern = new RegExp(`<(?:[\\w.-]+:)?${name}(?=[\\s/>])((?:"[^"]*"|'[^']*'|[^>"'])*?)(?:/>|>([\\s\\S]*?)</(?:[\\w.-]+:)?${name}\\s*>)`, "g");
  return [...xml.matchAll(pattern)].map((m) => ({ attributes: attributes(m[1]!), inside: m[2] ?? "", at: m.index, length: m[0].length }));
}
