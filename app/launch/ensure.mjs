// Runs before node_modules exist, so it uses Node alone. Installs what `npm start`, `npm run dev` and `npm test` need,
// or prints the one line that does.
import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { accessSync, constants, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";

const project = join(dirname(fileURLToPath(import.meta.url)), "../..");
const stampFile = join(project, "node_modules", ".stillpeg-stamp");
const oldestNode = [20, 19];

/** Debian packages by the programs they bring. Ordinary users of Debian have no sbin in their PATH. */
const tools = {
  mariadb: { programs: ["mariadbd", "mariadb-install-db"], package: "mariadb-server", name: "MariaDB" },
  chromium: { programs: ["chromium"], package: "chromium", name: "Chromium" },
};
const sbin = ["/usr/local/sbin", "/usr/sbin", "/sbin"];

function fail(line) {
  console.error(line);
  process.exit(1);
}

function checkNode() {
  const [major, minor] = process.versions.node.split(".").map(Number);
  const [oldMajor, oldMinor] = oldestNode;
  if (major > oldMajor || (major === oldMajor && minor >= oldMinor)) return;
  fail(`Stillpeg needs Node ${oldestNode.join(".")} or newer, and this is ${process.versions.node}.`);
}

function isInstalled(program) {
  return [...(process.env.PATH ?? "").split(":").filter(Boolean), ...sbin].some((folder) => {
    try {
      accessSync(join(folder, program), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });
}

function ensureTools(names) {
  const missing = names.map((name) => tools[name]).filter((tool) => !tool.programs.every(isInstalled));
  if (missing.length === 0) return;
  const packages = missing.map((tool) => tool.package).join(" ");
  const what = missing.map((tool) => tool.name).join(" and ");
  const isOrAre = missing.length > 1 ? "are" : "is";
  const byHand = `apt-get update && apt-get install -y ${packages}`;
  if (process.getuid?.() !== 0)
    fail(`${what} ${isOrAre} missing. Run this, then start again: sudo sh -c "${byHand}"`);
  if (!isInstalled("apt-get"))
    fail(`${what} ${isOrAre} missing, and there is no apt-get here to install ${packages} with.`);
  console.log(`Installing ${what}.`);
  apt(["update"], byHand);
  apt(["install", "-y", "--no-install-recommends", ...packages.split(" ")], byHand);
  const still = missing.filter((tool) => !tool.programs.every(isInstalled));
  if (still.length > 0)
    fail(`${packages} was installed, and ${still.map((tool) => tool.name).join(" and ")} is still missing.`);
}

/** Shows what apt said only where it failed. */
function apt(args, byHand) {
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const { status, stdout, stderr, error } = spawnSync("apt-get", args, {
    env,
    encoding: "utf8",
    maxBuffer: 64 << 20,
  });
  if (status === 0) return;
  process.stderr.write(`${stdout ?? ""}${stderr ?? ""}`);
  fail(`apt-get ${args[0]} failed (${error?.message ?? `exit ${status}`}). Run by hand: ${byHand}`);
}

function ensurePackages() {
  const stamp = createHash("sha256")
    .update(readFileSync(join(project, "package-lock.json")))
    .update(process.version)
    .digest("hex");
  if (readStamp() === stamp) return;
  console.log("Installing the packages that package-lock.json names.");
  const args = ["ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"];
  const { status, error } = spawnSync("npm", args, { cwd: project, stdio: ["ignore", "inherit", "inherit"] });
  if (status !== 0) fail(`npm ci failed (${error?.message ?? `exit ${status}`}). What it said stands above.`);
  mkdirSync(dirname(stampFile), { recursive: true });
  writeFileSync(stampFile, `${stamp}\n`);
}

function readStamp() {
  try {
    return readFileSync(stampFile, "utf8").trim();
  } catch {
    return null;
  }
}

// "database" is MariaDB unless an address says that there is one already.
const asked = process.argv
  .slice(2)
  .filter((name) => name !== "database" || !process.env.DATABASE_URL)
  .map((name) => (name === "database" ? "mariadb" : name));
const unknown = asked.filter((name) => !(name in tools));
if (unknown.length > 0)
  fail(`Unknown tool: ${unknown.join(", ")}. Known are ${Object.keys(tools).join(", ")}.`);
checkNode();
ensureTools(asked);
ensurePackages();
