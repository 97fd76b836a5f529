import { strToU8 } from "fflate";
import { partText, type BookPackage } from "./open-package";
import { relationships } from "./relationships";

/**
 * Takes the list of calculation order out of a package, with its link and content type: it names formula cells that are none any more,
 * which a spreadsheet program takes for damage. Programs make it anew.
 */
export function dropCalcChain(book: BookPackage, workbookPart: string): Map<string, Uint8Array> {
  const chain = relationships(book, workbookPart).find((r) => r.kind === "calcChain");
  if (!chain) return book.parts;
  const parts = new Map(book.parts);
  parts.delete(chain.target);
  const folder = workbookPart.slice(0, workbookPart.lastIndexOf("/") + 1);
  const linksPart = `${folder}_rels/${workbookPart.slice(folder.length)}.rels`;
  const drop = (name: string, element: string, tells: (tag: string) => boolean) => {
    const text = partText(book, name);
    const pattern = new RegExp(`<(?:[\\w.-]+:)?${element}(?=[\\s/>])(?:[^<>"']|"[^"]*"|'[^']*')*(?:/>|>\\s*</(?:[\\w.-]+:)?${element}\\s*>)`, "g");
    parts.set(name, strToU8(text.replace(pattern, (tag) => (tells(tag) ? "" : tag))));
  };
  drop(linksPart, "Relationship", (tag) => /\sType=["'][^"']*\/calcChain["']/.test(tag));
  drop("[Content_Types].xml", "Override", (tag) => new RegExp(`\\sPartName=["']/${chain.target.replace(/[.*+?^${}()|[\]\\]/g, "\\$&")}["']`, "i").test(tag));
  return parts;
}
