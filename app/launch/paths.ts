import { resolve } from "node:path";
import { fileURLToPath } from "node:url";

/** The project's folder, wherever it was cloned to and wherever it is started from. */
export const projectFolder = fileURLToPath(new URL("../..", import.meta.url)).replace(/\/$/, "");

/** What an installation keeps: its secrets and, unless DATABASE_URL says otherwise, its database. */
export const dataFolder = resolve(projectFolder, process.env.DATA_FOLDER || ".data");
export const buildFolder = `${projectFolder}/build`;
