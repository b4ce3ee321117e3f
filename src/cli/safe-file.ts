import { realpathSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { basename, dirname, join, resolve } from "node:path";

/** A file that cannot be written; the message is one line for the user. */
export class UnwritableError extends Error {
  override readonly name = "UnwritableError";
}

/** Writes a whole file or nothing: beside it first, then renamed into its place. */
export function writeWhole(path: string, bytes: Uint8Array): void {
  const aside = join(dirname(path), `.${basename(path)}.${process.pid}.part`);
  try {
    writeFileSync(aside, bytes, { flag: "wx" });
    renameSync(aside, path);
  } catch (error) {
    rmSync(aside, { force: true });
    const { code } = error as NodeJS.ErrnoException;
    const why = code === "ENOENT" ? "there is no such folder" : code === "EACCES" ? "no permission" : String(code);
    throw new UnwritableError(`${path} cannot be written: ${why}`);
  }
}

/** Whether two paths name the same file, links followed. */
export function sameFile(a: string, b: string): boolean {
  return real(a) === real(b);
}

function real(path: string): string {
  try {
    return realpathSync(path);
  } catch {
    return resolve(path);
  }
}
