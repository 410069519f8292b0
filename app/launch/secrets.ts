import { randomBytes, randomInt } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { z } from "zod";
import { dataFolder } from "./paths.ts";
import { PlainError } from "./plain-error.ts";

const kept = z.object({ sessionSecret: z.string(), passwordPepper: z.string(), demoPassword: z.string() });

export type Secrets = z.output<typeof kept>;

const file = `${dataFolder}/secrets.json`;

/**
 * The secrets of an installation: from the environment, else made at first start and kept in a file that only its
 * owner may read. In production none is made up, since a second machine would make up others.
 * @throws PlainError where production lacks one, or the file was damaged
 */
export function readSecrets(env: NodeJS.ProcessEnv): Secrets {
  const missing = ["SESSION_SECRET", "PASSWORD_PEPPER"].filter((name) => !env[name]);
  if (env.NODE_ENV === "production" && missing.length > 0) {
    throw new PlainError(
      `In production ${missing.join(" and ")} must be set; make one with: openssl rand -hex 32`,
    );
  }
  const local = readKept();
  return {
    sessionSecret: env.SESSION_SECRET || local.sessionSecret,
    passwordPepper: env.PASSWORD_PEPPER || local.passwordPepper,
    demoPassword: env.DEMO_PASSWORD || local.demoPassword,
  };
}

function readKept(): Secrets {
  if (!existsSync(file)) return make();
  const read = kept.safeParse(parse(readFileSync(file, "utf8")));
  if (!read.success) {
    throw new PlainError(
      `${file} is damaged. Put it back, or delete it: then everybody signs in with a new password.`,
    );
  }
  return read.data;
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

function make(): Secrets {
  const made: Secrets = {
    sessionSecret: randomBytes(32).toString("hex"),
    passwordPepper: randomBytes(32).toString("hex"),
    demoPassword: easyPassword(),
  };
  mkdirSync(dataFolder, { recursive: true, mode: 0o700 });
  writeFileSync(`${file}.new`, `${JSON.stringify(made, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return made;
}

const letters = "abcdefghjkmnpqrstuvwxyz23456789";

/** Three groups of five: 74 bits, and easy to type from a screen. */
function easyPassword(): string {
  const group = () => Array.from({ length: 5 }, () => letters[randomInt(letters.length)]).join("");
  return [group(), group(), group()].join("-");
}
