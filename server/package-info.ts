import { existsSync, readFileSync } from "node:fs";
import { dirname, join } from "node:path";

/**
 * The folder that holds package.json, found by walking up from this file, so that the sources and the
 * compiled output (one folder deeper) find the same one.
 */
export const packageRoot: string = nearestPackage(import.meta.dirname);

/** The version in package.json; every answer that was computed carries it. */
export const engineVersion: string = readVersion();

function nearestPackage(folder: string): string {
  if (existsSync(join(folder, "package.json"))) return folder;
  const parent = dirname(folder);
  if (parent === folder) throw new Error("package.json was not found above the program");
  return nearestPackage(parent);
}

function readVersion(): string {
  const { version } = JSON.parse(readFileSync(join(packageRoot, "package.json"), "utf8")) as {
    version: string;
  };
  return version;
}
