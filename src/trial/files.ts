/** Opening, dropping and saving of workbooks, and the examples. */
import { element, hush, showFileName, tell, whileBusy } from "./frame";
import type { Grid, WorkbookModel } from "./grid";
import { type Opened, openWorkbook } from "./open";
import { pageSetUp } from "./losses";
import { saveWorkbook } from "./save";
import { NotAWorkbook } from "./zip";

const type = "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";

export interface Files {
  open(name: string, bytes: ArrayBuffer): Promise<boolean>;
  /** the opened file, if the sheet came from one */
  source(): Opened | undefined;
  /** what the pane keeps in the workbook */
  notes(): string | null;
  keepNotes(text: string): void;
}

export function createFiles(grid: Grid): Files {
  let source: Opened | undefined;
  let notes: string | null = null;
  let name = "Workbook.xlsx";

  async function open(fileName: string, bytes: ArrayBuffer): Promise<boolean> {
    hush();
    try {
      await whileBusy(`Opening ${fileName} …`, async () => {
        const opened = openWorkbook(new Uint8Array(bytes));
        await grid.show(opened.data, (model) => {
          rememberShown(model, opened);
          source = opened;
          notes = opened.notes;
          name = fileName;
        });
      });
    } catch (error) {
      if (!(error instanceof NotAWorkbook) || error.cause) console.error(error);
      const reason = error instanceof NotAWorkbook ? error.message : "Its contents could not be read.";
      tell(`${fileName} was not opened. ${reason} The sheet is as it was.`);
      return false;
    }
    showFileName(fileName);
    const shown = source!.losses.filter((loss) => loss !== pageSetUp);
    if (shown.length > 0) tell("The trial sheet does not show these, and a saved copy will not have them:", ...shown);
    return true;
  }

  async function save(copyName: string): Promise<void> {
    hush();
    try {
      const saved = await whileBusy("Saving …", () => saveWorkbook(grid.model(), source, notes));
      download(copyName, saved.bytes);
      if (saved.notes.length > 0) tell(`${copyName} was saved. It does not have:`, ...saved.notes);
    } catch (error) {
      console.error(error);
      tell(`No copy was saved: ${(error as Error).message}.`);
    }
  }

  const input = element<HTMLInputElement>("file");
  element("open").addEventListener("click", () => input.click());
  input.addEventListener("change", () => {
    const file = input.files?.[0];
    input.value = "";
    if (file) void file.arrayBuffer().then((bytes) => open(file.name, bytes));
  });
  acceptDrops((file) => void file.arrayBuffer().then((bytes) => open(file.name, bytes)));
  askForName(
    () => name,
    (copyName) => void save(copyName),
  );
  return { open, source: () => source, notes: () => notes, keepNotes: (text) => void (notes = text) };
}

/** The texts that formulas have right after opening: what still reads so on saving is unchanged. */
function rememberShown(model: WorkbookModel, opened: Opened): void {
  for (const [sheetId, cells] of opened.origins)
    for (const [address, origin] of cells) {
      const position = model.getters.getRangeFromSheetXC(sheetId, address).zone;
      const cell = { sheetId, col: position.left, row: position.top };
      origin.shown = model.getters.getCellText(cell, { showFormula: true });
    }
}

function download(fileName: string, bytes: Uint8Array): void {
  const url = URL.createObjectURL(new Blob([bytes as BlobPart], { type }));
  const link = Object.assign(document.createElement("a"), { href: url, download: fileName });
  link.click();
  setTimeout(() => URL.revokeObjectURL(url), 10_000);
}

function acceptDrops(take: (file: File) => void): void {
  const veil = element("drop");
  const carriesFile = (event: DragEvent): boolean => event.dataTransfer?.types.includes("Files") ?? false;
  addEventListener("dragover", (event) => {
    if (!carriesFile(event)) return;
    event.preventDefault();
    veil.hidden = false;
  });
  addEventListener("dragleave", (event) => {
    if (event.relatedTarget === null) veil.hidden = true;
  });
  addEventListener("drop", (event) => {
    if (!carriesFile(event)) return;
    event.preventDefault();
    veil.hidden = true;
    const file = event.dataTransfer?.files[0];
    if (file) take(file);
  });
}

/** Asks under which name to save; the original's own name is not accepted. */
function askForName(original: () => string, chosen: (name: string) => void): void {
  const dialog = element<HTMLDialogElement>("save-dialog");
  const field = element<HTMLInputElement>("save-name");
  element("save").addEventListener("click", () => {
    field.value = original().replace(/(\.xls[xm])?$/i, " copy.xlsx");
    field.setCustomValidity("");
    dialog.showModal();
    field.setSelectionRange(0, field.value.length - ".xlsx".length);
  });
  field.addEventListener("input", () => field.setCustomValidity(""));
  element("save-form").addEventListener("submit", (event) => {
    event.preventDefault();
    const name = field.value.trim().replace(/(\.xlsx)?$/i, ".xlsx");
    const problem =
      name === ".xlsx" || /[\\/:*?"<>|]/.test(name)
        ? 'Give a file name without \\ / : * ? " < > |'
        : name.toLowerCase() === original().toLowerCase()
          ? "Choose another name: the original is never overwritten."
          : "";
    field.setCustomValidity(problem);
    if (!field.reportValidity()) return;
    dialog.close();
    chosen(name);
  });
  element("save-cancel").addEventListener("click", () => dialog.close());
}
