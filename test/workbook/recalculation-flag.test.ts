import { asksRecalculation, withRecalculation } from "../../src/workbook/recalculation-flag";

// Order of the elements: ECMA-376 Part 1, 18.2.27 (CT_Workbook).
test.each([
  ['<workbook><sheets><sheet/></sheets></workbook>', '<workbook><sheets><sheet/></sheets><calcPr fullCalcOnLoad="1"/></workbook>'],
  ['<x:workbook><x:sheets/><x:definedNames><x:definedName/></x:definedNames><x:oleSize/></x:workbook>', '<x:workbook><x:sheets/><x:definedNames><x:definedName/></x:definedNames><x:calcPr fullCalcOnLoad="1"/><x:oleSize/></x:workbook>'],
  ['<workbook><sheets/><externalReferences><externalReference/></externalReferences></workbook>', '<workbook><sheets/><externalReferences><externalReference/></externalReferences><calcPr fullCalcOnLoad="1"/></workbook>'],
  ['<workbook><sheets/><calcPr calcId="191029" fullCalcOnLoad="0"/></workbook>', '<workbook><sheets/><calcPr calcId="191029" fullCalcOnLoad="1"/></workbook>'],
  ['<workbook><sheets/><calcPr calcId="1"></calcPr></workbook>', '<workbook><sheets/><calcPr calcId="1" fullCalcOnLoad="1"></calcPr></workbook>'],
])("%s", (before, after) => {
  expect(asksRecalculation(before)).toBe(false);
  expect(withRecalculation(before)).toBe(after);
  expect(asksRecalculation(after)).toBe(true);
  expect(withRecalculation(after)).toBe(after);
});
