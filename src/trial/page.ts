/** Starts the trial sheet: the built add-in, the spreadsheet, and the frame around them. */
import { element, setUpPaneToggle, tell, whileBusy } from "./frame";
import { createGrid } from "./grid";
import { installHost } from "./host";
import { trimMenus } from "./menus";
import { type FunctionMetadata, registerErrors, registerFunctions } from "./register";

const functions = installHost(globalThis);

function loadScript(source: string): Promise<void> {
  return new Promise((resolve, reject) => {
    const script = document.createElement("script");
    script.src = source;
    script.onload = () => resolve();
    script.onerror = () => reject(new Error(`${source} could not be loaded`));
    document.head.append(script);
  });
}

async function fetched(source: string): Promise<Response> {
  const response = await fetch(source);
  if (!response.ok) throw new Error(`${source} could not be loaded (${response.status})`);
  return response;
}

async function start(): Promise<void> {
  const [metadata, templates] = await Promise.all([
    fetched("../functions.json").then((response) => response.json() as Promise<{ functions: FunctionMetadata[] }>),
    fetched("library/o_spreadsheet.xml").then((response) => response.text()),
    loadScript("../functions.js"),
  ]);
  registerErrors();
  registerFunctions(metadata.functions, functions);
  trimMenus();
  setUpPaneToggle();
  element("notice-close").addEventListener("click", () => (element("notice").hidden = true));
  const grid = createGrid(element("grid"), templates, tell);
  await grid.show({});
  Object.assign(globalThis, { plinthTrial: { model: grid.model } });
  document.documentElement.dataset.ready = "true";
}

whileBusy("Starting …", start).catch((error: Error) => {
  console.error(error);
  tell(`The trial sheet could not start: ${error.message}.`);
});
