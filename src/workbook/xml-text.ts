/** Text and attributes of the XML parts of a workbook; parts with a document type are refused before they come here. */

import { WorkbookError } from "./workbook-error";

/** White space that may stand in an end tag; nobody writes more. */
const LONGEST_GAP = 16;
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

/** Characters → the inside of a formula element, which knows entities only. */
export function formulaXml(text: string): string {
  return text.replace(/[&<>]/g, (c) => (c === "&" ? "&amp;" : c === "<" ? "&lt;" : "&gt;"));
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

/** The inside of a start tag; `<` stands in no attribute, so that a tag never closed is found out at once. */
const TAG_INSIDE = `((?:[^<>"']|"[^"<]*"|'[^'<]*')*)`;

/** All elements of a name, with any prefix; elements of one name must not be nested in each other. */
export function elements(xml: string, name: string): XmlElement[] {
  return [...scanElements(xml, name, 0, xml.length)];
}

/** The elements of a name that begin between two places of a part, one after the other in time that grows with the part's length only. */
export function* scanElements(xml: string, name: string, from: number, to: number): Generator<XmlElement> {
  const start = new RegExp(`<([\\w.-]+:)?${name}(?=[\\s/>])${TAG_INSIDE}>`, "g");
  start.lastIndex = from;
  for (let m = start.exec(xml); m && m.index < to; m = start.exec(xml)) {
    const isEmpty = m[2]!.endsWith("/");
    const begin = start.lastIndex;
    const end = isEmpty ? begin : endTag(xml, `</${m[1] ?? ""}${name}`, begin);
    const after = isEmpty ? begin : xml.indexOf(">", end) + 1;
    yield { attributes: attributes(m[2]!), inside: xml.slice(begin, end), at: m.index, length: after - m.index };
    start.lastIndex = after;
  }
}

function endTag(xml: string, tag: string, from: number): number {
  for (let at = xml.indexOf(tag, from); at >= 0; at = xml.indexOf(tag, at + tag.length)) if (/^\s*>/.test(xml.slice(at + tag.length, at + tag.length + LONGEST_GAP))) return at;
  throw new WorkbookError(`The file is damaged: ${tag.replace("</", "<")}> is opened in it and never closed.`);
}
