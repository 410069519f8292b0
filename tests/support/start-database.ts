import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import type { TestProject } from "vitest/node";
import { endLeftBehind, startMariaDb } from "#app/launch/mariadb.ts";

declare module "vitest" {
  export interface ProvidedContext {
    /** The folder of the MariaDB that this run of tests has to itself. */
    databaseFolder: string;
    /** Address of the server's database for the application; others on it are named stillpeg_… */
    databaseUrl: string;
  }
}

/** A real MariaDB for the tests of one project, on a folder that is gone afterwards. */
export default async function startDatabase(project: TestProject) {
  const folder = mkdtempSync(`${process.env.STILLPEG_TEST_FOLDER ?? tmpdir()}/stillpeg-db-`);
  const server = await startMariaDb(folder, { throwaway: true });
  project.provide("databaseFolder", folder);
  project.provide("databaseUrl", server.url);
  return async () => {
    await server.stop();
    // A test may have stopped that server and started another on the same data.
    await endLeftBehind(folder);
    rmSync(folder, { recursive: true, force: true });
  };
}
