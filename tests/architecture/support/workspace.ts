import { existsSync, readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { root } from "../../../scripts/settings.mjs";

export interface Manifest {
  readonly name: string;
  readonly exports?: Record<string, string>;
  readonly dependencies?: Record<string, string>;
  readonly devDependencies?: Record<string, string>;
}

export const readText = (path: string): string => readFileSync(join(root, path), "utf8");

function manifestsIn(folder: string): [string, Manifest][] {
  return readdirSync(join(root, folder))
    .filter((name) => existsSync(join(root, folder, name, "package.json")))
    .map((name) => [name, JSON.parse(readText(`${folder}/${name}/package.json`)) as Manifest]);
}

/** Short name ("core", "staff") to what its package.json says. */
export const manifests: ReadonlyMap<string, Manifest> = new Map([
  ...manifestsIn("packages"),
  ...manifestsIn("apps"),
]);

const pureRules = ["diary", "clinical", "billing"];
const belowServices = ["core", ...pureRules, "contracts", "db", "documents", "gateways"];

/** Who may import whom. What is not named here is not allowed. */
export const allowedImports: Readonly<Record<string, readonly string[]>> = {
  core: [],
  diary: ["core"],
  clinical: ["core"],
  billing: ["core"],
  contracts: ["core", ...pureRules],
  db: ["core", ...pureRules],
  documents: ["core", "contracts", ...pureRules],
  gateways: ["core", "contracts", ...pureRules],
  services: belowServices,
  ui: ["core"],
  staff: ["ui", "contracts", "core", ...pureRules, "services"],
  worker: ["core", "services"],
  fakes: ["core"],
};
