import { fileURLToPath } from "node:url";

/** The project's folder, wherever it was cloned to and wherever it is started from. */
export const projectFolder = fileURLToPath(new URL("../..", import.meta.url)).replace(/\/$/, "");

export const dataFolder = `${projectFolder}/.data`;
export const buildFolder = `${projectFolder}/build`;
