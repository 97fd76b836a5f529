import { catalogue } from "../cells/generated/catalogue";
import { wallFunctions } from "../cells/generated/functions";
import { mountPane } from "../pane/mount-pane";
import { excelSheetHost } from "./excel-sheet-host";

void Office.onReady((info) => {
  const root = document.getElementById("pane");
  if (!root) throw new Error("The pane's page has lost its #pane element.");
  if (info.host !== Office.HostType.Excel) {
    root.textContent = "This page is Wallsheet's pane in Excel. Without Excel, use the bench: npm start.";
    return;
  }
  mountPane(root, excelSheetHost(), catalogue, { call: (name, args) => wallFunctions[name]!(...args, {}) });
});
