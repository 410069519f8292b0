import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { buildFolder, projectFolder } from "./paths.ts";
import { PlainError } from "./plain-error.ts";
import { run } from "./processes.ts";

const sources = [
  "app",
  "public",
  "package-lock.json",
  "react-router.config.ts",
  "tsconfig.json",
  "vite.config.ts",
];
const stampFile = `${buildFolder}/source-hash`;

/** Builds what is served, where it was not built from these very sources. Answers with whether it had to. */
export async function buildIfChanged(signal?: AbortSignal): Promise<boolean> {
  const hash = sourceHash();
  if (existsSync(stampFile) && readFileSync(stampFile, "utf8") === hash) return false;
  rmSync(stampFile, { force: true });
  const { code, output } = await run(
    process.execPath,
    ["node_modules/@react-router/dev/bin.js", "build", "--logLevel", "warn"],
    {
      cwd: projectFolder,
      env: { ...process.env, NODE_ENV: "production" },
      signal,
    },
  );
  if (code !== 0) throw new PlainError(`The build failed.\n${output.trim()}`);
  writeFileSync(stampFile, hash);
  return true;
}

/** One hash over the names and contents of all that a build is made of. */
export function sourceHash(): string {
  const hash = createHash("sha256").update(process.version);
  for (const file of sources.flatMap((source) => filesIn(source)).sort()) {
    hash.update(`\0${file}\0`).update(readFileSync(`${projectFolder}/${file}`));
  }
  return hash.digest("hex");
}

function filesIn(path: string): string[] {
  if (!statSync(`${projectFolder}/${path}`).isDirectory()) return [path];
  return readdirSync(`${projectFolder}/${path}`, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => `${entry.parentPath}/${entry.name}`.slice(projectFolder.length + 1));
}
