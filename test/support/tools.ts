/**
 * Before any test: installs the programs beside Node that tests run, where the machine lacks them and allows it. Once and
 * not from the tests themselves, which run side by side. What cannot be installed is left to the tests that need it,
 * which fail and say what to do.
 */
import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";
import { findChromium } from "./browser";
import { findSoffice } from "./libreOffice";

/** Debian package -> whether the machine has what it brings. */
const needed: Record<string, () => boolean> = {
  chromium: () => succeeds(findChromium),
  "libreoffice-calc": () => succeeds(findSoffice),
  "libxml2-utils": () => spawnSync("xmllint", ["--version"]).status === 0,
};

export default function installMissingTools(): void {
  const missing = Object.keys(needed).filter((name) => !needed[name]!());
  if (missing.length === 0 || !existsSync("/usr/bin/apt-get") || process.getuid?.() !== 0) return;
  console.log(`\ninstalling for the tests: ${missing.join(", ")}`);
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  spawnSync("apt-get", ["update", "-q"], { stdio: "ignore", env });
  spawnSync("apt-get", ["install", "-q", "-y", "--no-install-recommends", ...missing], { stdio: "ignore", env });
}

function succeeds(find: () => string): boolean {
  try {
    return find() !== "";
  } catch {
    return false;
  }
}
