const CALC = /<((?:[\w.-]+:)?)calcPr(?=[\s/>])((?:"[^"]*"|'[^']*'|[^>"'])*?)(\/?)>/;
/** Elements of the workbook part that stand before `calcPr` (ECMA-376 Part 1, 18.2.27), the last first. */
const BEFORE = ["definedNames", "externalReferences", "functionGroups", "sheets"];

/** The book asks for a full recalculation when it is opened: whoever wrote it did not vouch for its values. */
export function asksRecalculation(workbookXml: string): boolean {
  return /\sfullCalcOnLoad\s*=\s*["'](?:1|true)["']/.test(CALC.exec(workbookXml)?.[2] ?? "");
}

/** The workbook part with that wish in it; every other byte stays. */
export function withRecalculation(workbookXml: string): string {
  if (asksRecalculation(workbookXml)) return workbookXml;
  const found = CALC.exec(workbookXml);
  if (found) {
    const [whole, prefix, attributes, end] = found as unknown as [string, string, string, string];
    const tag = `<${prefix}calcPr${attributes.replace(/\s+fullCalcOnLoad\s*=\s*(?:"[^"]*"|'[^']*')/, "").trimEnd()} fullCalcOnLoad="1"${end}>`;
    return workbookXml.slice(0, found.index) + tag + workbookXml.slice(found.index + whole.length);
  }
  for (const name of BEFORE) {
    const closing = [...workbookXml.matchAll(new RegExp(`</((?:[\\w.-]+:)?)${name}\\s*>|<((?:[\\w.-]+:)?)${name}(?:\\s[^<>]*)?/>`, "g"))].at(-1);
    if (!closing) continue;
    const at = closing.index + closing[0].length;
    return `${workbookXml.slice(0, at)}<${closing[1] ?? closing[2] ?? ""}calcPr fullCalcOnLoad="1"/>${workbookXml.slice(at)}`;
  }
  return workbookXml;
}
