import { findPasswordHash } from "../models/people.server.ts";
import { closeDb, getDb } from "../services/db.server.ts";
import { closePasswordPool, hashPassword, isPassword } from "../services/password.server.ts";
import { demoPeople } from "./demo-act.ts";
import { seedDemo } from "./demo-seed.ts";

/**
 * Puts the demo act in at first start. Answers with whether `password` signs its people in: somebody may have changed
 * it since, or started with another DEMO_PASSWORD.
 */
export async function readyDemo(password: string): Promise<boolean> {
  const db = getDb();
  try {
    const present = await findPasswordHash(db, demoPeople[0].email);
    if (present) return await isPassword(password, present.passwordHash);
    await seedDemo(db, await hashPassword(password), new Date());
    return true;
  } finally {
    await Promise.all([closePasswordPool(), closeDb()]);
  }
}

/** Who can sign in to look around, for the terminal. */
export function demoLines(password: string, holds: boolean): string[] {
  const people = demoPeople.map(({ role, email }) => `  ${role.padEnd(10)} ${email}`);
  const intro = holds
    ? ["The demo act's people, all with the password", `  ${password}`]
    : ["The demo act's people, with the passwords they were given at first start or have chosen since:"];
  return [...intro, ...people];
}
