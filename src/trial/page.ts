/** Starts the trial sheet: the built add-in, the spreadsheet, and the frame around them. */
import about from "../../package.json";
import { examples } from "./examples/list";
import { registerBorrowed } from "./borrowed";
import { createFiles } from "./files";
import { element, setUpMenu, setUpPaneToggle, setUpRegions, tell, whileBusy } from "./frame";
import { createGrid } from "./grid";
import { installHost } from "./host";
import { colourFormulas, trimMenus } from "./menus";
import type { FunctionMetadata } from "./metadata";
import { createSheet } from "./sheet";
import { registerErrors, registerFunctions } from "./register";

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

async function openExample(files: ReturnType<typeof createFiles>, file: string): Promise<void> {
  try {
    const response = await fetched(`examples/${file}`);
    await files.open(file, await response.arrayBuffer());
  } catch (error) {
    tell(`The example could not be loaded: ${(error as Error).message}.`);
  }
}

async function start(): Promise<void> {
  const pane = import(/* webpackChunkName: "pane" */ "../pane/pane");
  const [metadata, templates] = await Promise.all([
    fetched("../functions.json").then((response) => response.json() as Promise<{ functions: FunctionMetadata[] }>),
    fetched("library/o_spreadsheet.xml").then((response) => response.text()),
    loadScript("../functions.js"),
  ]);
  registerErrors();
  registerBorrowed();
  registerFunctions(metadata.functions, functions);
  trimMenus();
  colourFormulas();
  setUpPaneToggle();
  setUpRegions();
  element("notice-close").addEventListener("click", () => (element("notice").hidden = true));
  const grid = createGrid(element("grid"), templates, tell);
  const files = createFiles(grid);
  setUpMenu(
    element("examples"),
    element("example-list"),
    examples.map(({ file, label, says }) => ({ label, says, choose: () => void openExample(files, file) })),
  );
  await grid.show({});
  const sheet = createSheet(grid, files);
  Object.assign(globalThis, { plinthTrial: { model: grid.model, sheet } });
  document.documentElement.dataset.ready = "true";
  const { startPane } = await pane;
  startPane(element("pane"), sheet, { referenceUrl: "../reference.html", version: about.version });
}

whileBusy("Starting …", start).catch((error: Error) => {
  console.error(error);
  tell(`The trial sheet could not start: ${error.message}.`);
});
