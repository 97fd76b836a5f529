import { partText, type BookPackage } from "./open-package";
import { elements } from "./xml-text";

/** A link from one part to another. */
export interface Relationship {
  id: string;
  /** Last word of the relationship's type, e.g. `worksheet`. */
  kind: string;
  /** Path of the target part inside the package. */
  target: string;
}

/** The links of a part (`""` for the package itself); targets outside the package are left out. */
export function relationships(book: BookPackage, part: string): Relationship[] {
  const folder = part.slice(0, part.lastIndexOf("/") + 1);
  const name = `${folder}_rels/${part.slice(folder.length)}.rels`;
  if (!book.parts.has(name)) return [];
  return elements(partText(book, name), "Relationship")
    .filter((e) => e.attributes["TargetMode"] !== "External")
    .map(({ attributes: a }) => ({ id: a["Id"] ?? "", kind: (a["Type"] ?? "").split("/").pop()!, target: resolved(folder, a["Target"] ?? "") }));
}

function resolved(folder: string, target: string): string {
  const path = target.startsWith("/") ? target.slice(1) : folder + target;
  const steps: string[] = [];
  for (const step of path.split("/")) {
    if (step === "..") steps.pop();
    else if (step !== "." && step !== "") steps.push(step);
  }
  return steps.join("/").replace(/%([0-7][0-9a-f])/gi, (_whole, hex: string) => String.fromCharCode(parseInt(hex, 16)));
}
