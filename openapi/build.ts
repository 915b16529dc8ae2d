import { readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { packageRoot } from "../server/package-info.ts";
import { routes } from "../server/routes/index.ts";
import { buildDocument } from "./document.ts";

const FILE = join(packageRoot, "openapi", "openapi.json");
const text = `${JSON.stringify(buildDocument(routes), null, 2)}\n`;

if (!process.argv.includes("--check")) {
  writeFileSync(FILE, text);
} else if (readFileSync(FILE, "utf8") !== text) {
  console.error(
    "openapi/openapi.json is not what the routes say. Run `npm run openapi` and commit the file.",
  );
  process.exitCode = 1;
}
