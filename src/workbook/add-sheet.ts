import { strToU8 } from "fflate";
import { partText, type BookPackage } from "./open-package";
import { WorkbookError } from "./workbook-error";
import { attributes } from "./xml-text";

const SHEET_CONTENT = "application/vnd.openxmlformats-officedocument.spreadsheetml.worksheet+xml";
const CONTENT_TYPES = "[Content_Types].xml";

/** A worksheet to be put behind the others. */
export interface NewSheet {
  name: string;
  /** Its part's text; `namespace` is that of the book's own sheets. */
  xml: (namespace: string) => string;
}

/** Puts a worksheet behind the others: its part, its content type, its link and its line in the workbook part. Gives the changed parts. */
export function addSheet(book: BookPackage, workbookPart: string, sheet: NewSheet): Map<string, Uint8Array> {
  const parts = new Map(book.parts);
  const text = (name: string) => partText({ ...book, parts }, name);
  const put = (name: string, xml: string) => parts.set(name, strToU8(xml));
  const folder = workbookPart.slice(0, workbookPart.lastIndexOf("/") + 1);
  const taken = new Set([...parts.keys()].map((name) => name.toLowerCase()));
  const file = firstFree((n) => `worksheets/sheet${n}.xml`, (name) => taken.has((folder + name).toLowerCase()));

  const workbook = text(workbookPart);
  const root = attributes(/<(?:[\w.-]+:)?workbook(?=[\s>])((?:[^<>"']|"[^"]*"|'[^']*')*)>/.exec(workbook)![1]!);
  const linksPart = `${folder}_rels/${workbookPart.slice(folder.length)}.rels`;
  const links = text(linksPart);
  const id = firstFree((n) => `rId${n}`, (candidate) => new RegExp(`\\sId=["']${candidate}["']`).test(links));
  const type = /\sType=["']([^"']*\/worksheet)["']/.exec(links)![1]!;
  put(linksPart, beforeEnd(links, "Relationships", (p) => `<${p}Relationship Id="${id}" Type="${type}" Target="${file}"/>`));

  const types = text(CONTENT_TYPES);
  put(CONTENT_TYPES, beforeEnd(types, "Types", (p) => `<${p}Override PartName="/${folder}${file}" ContentType="${SHEET_CONTENT}"/>`));

  const ids = [...workbook.matchAll(/\ssheetId=["'](\d+)["']/g)].map((m) => Number(m[1]));
  const space = type.slice(0, type.lastIndexOf("/"));
  const prefix = Object.entries(root).find(([key, value]) => key.startsWith("xmlns:") && value === space)?.[0].slice(6);
  const link = prefix === undefined ? `xmlns:r="${space}" r:id="${id}"` : `${prefix}:id="${id}"`;
  put(workbookPart, beforeEnd(workbook, "sheets", (p) => `<${p}sheet name="${attributeText(sheet.name)}" sheetId="${Math.max(0, ...ids) + 1}" ${link}/>`));

  const own = /<([\w.-]+:)?workbook(?=[\s>])/.exec(workbook)![1]?.slice(0, -1);
  const namespace = root[own === undefined ? "xmlns" : `xmlns:${own}`] ?? "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
  put(folder + file, sheet.xml(namespace));
  return parts;
}

/** The first of the numbered names, from 1, that is not taken. */
export function firstFree(name: (n: number) => string, isTaken: (name: string) => boolean): string {
  for (let n = 1; ; n++) if (!isTaken(name(n))) return name(n);
}

/** Text put before an element's end tag, in the element's own prefix. */
function beforeEnd(xml: string, element: string, text: (prefix: string) => string): string {
  const m = new RegExp(`</([\\w.-]+:)?${element}\\s*>`).exec(xml);
  if (!m) throw new WorkbookError(`The file is damaged: an end tag of ${element} is missing in it.`);
  return xml.slice(0, m.index) + text(m[1] ?? "") + xml.slice(m.index);
}

function attributeText(text: string): string {
  return text.replace(/[&<"]/g, (c) => (c === "&" ? "&amp;" : c === "<" ? "&lt;" : "&quot;"));
}
