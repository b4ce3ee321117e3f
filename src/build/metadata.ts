/** Makes functions.json, what the host knows of our functions, and checks what the metadata tool lets pass. */
import { readFileSync, writeFileSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { generateCustomFunctionsMetadata } from "custom-functions-metadata";
import { FAMILIES, readFunctionDocs } from "./functionDocs";

interface MetadataFunction {
  id: string;
  name: string;
  description: string;
  helpUrl?: string;
  parameters: { name: string; description: string; type: string; dimensionality?: string; optional?: boolean }[];
  result: object;
}

export interface Metadata {
  allowErrorForDataTypeAny: boolean;
  functions: MetadataFunction[];
}

/** The metadata of every function, its help pointing into the reference page at `url`. */
export async function functionsMetadata(url: string): Promise<Metadata> {
  const folder = join(import.meta.dirname, "../functions");
  const text = Object.keys(FAMILIES)
    .map((family) => readFileSync(join(folder, `${family}.ts`), "utf8").replace(/^import .*?;$/gms, ""))
    .join("\n");
  const scratch = mkdtempSync(join(tmpdir(), "plinth-"));
  try {
    const file = join(scratch, "functions.ts");
    writeFileSync(file, text);
    const { metadataJson, errors } = await generateCustomFunctionsMetadata(file, false);
    if (errors.length > 0) throw new Error(`metadata: ${errors.join("; ")}`);
    const { functions } = JSON.parse(metadataJson) as Metadata;
    for (const each of functions) each.helpUrl = `${url}/reference.html#${each.id}`;
    check(functions);
    return { allowErrorForDataTypeAny: true, functions };
  } finally {
    rmSync(scratch, { recursive: true });
  }
}

function check(functions: MetadataFunction[]): void {
  const docs = readFunctionDocs();
  const problems: string[] = [];
  const ids = functions.map(({ id }) => id);
  if (ids.join() !== docs.map(({ id }) => id).join()) problems.push("the tool and we see different functions");
  if (new Set(ids).size < ids.length) problems.push("an id stands twice");
  for (const { id, name, description, parameters } of functions) {
    if (id !== name) problems.push(`${id}: id and name differ`);
    if (!/^[A-Z][A-Z0-9.]{2,63}$/.test(id)) problems.push(`${id}: an id has 3 to 64 letters, digits or dots`);
    if (/^[A-Z]{1,3}\d+$|^R\d*C\d*$/.test(id)) problems.push(`${id}: reads like a cell address`);
    if (description.length > 128) problems.push(`${id}: description over 128 characters`);
    if (description === "") problems.push(`${id}: no description`);
    for (const parameter of parameters) {
      const { length } = parameter.description;
      if (length === 0 || length > 512)
        problems.push(`${id}: description of ${parameter.name} has ${length} characters`);
    }
  }
  if (problems.length > 0) throw new Error(problems.join("\n"));
}
