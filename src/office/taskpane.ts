/** The add-in's pane in Excel; the page also loads functions.js, since functions and pane share one runtime. */
import about from "../../package.json";
import { startPane } from "../pane/pane";
import { createExcelSheet } from "./excelSheet";

await Office.onReady();
startPane(document.getElementById("pane")!, createExcelSheet(), {
  referenceUrl: "reference.html",
  version: about.version,
});
