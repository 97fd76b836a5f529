import type { CatalogueEntry } from "../cells/catalogue-entry";

/** Faults of names that Excel would refuse or read as something else. */
export function nameFaults(entries: readonly CatalogueEntry[]): string[] {
  const faults: string[] = [];
  const seen = new Set<string>();
  for (const { name, parameters, purpose } of entries) {
    if (!/^[A-Z][A-Z0-9_]*$/.test(name)) faults.push(`${name} is not capitals, digits and _`);
    if (name.length < 3) faults.push(`${name} is shorter than 3 characters`);
    if (name.length > 31) faults.push(`${name} is longer than 31 characters`);
    if (/^([A-Z]{1,3}[0-9]{1,7}|R[0-9]*C[0-9]*)$/.test(name)) faults.push(`${name} reads as a cell reference`);
    if (seen.has(name)) faults.push(`${name} is declared twice`);
    seen.add(name);
    if (purpose.length > 1024) faults.push(`${name} has a purpose longer than 1024 characters`);
    for (const p of parameters) if (p.description.length > 512) faults.push(`${name}: ${p.name} is described in more than 512 characters`);
    const optional = parameters.findIndex((p) => p.optional);
    if (optional >= 0 && parameters.slice(optional).some((p) => !p.optional)) faults.push(`${name} has an optional argument before a required one`);
  }
  return faults;
}
