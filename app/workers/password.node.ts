import { compareSync, hashSync } from "bcryptjs";

export type PasswordJob = { secret: string; cost: number } | { secret: string; hash: string };

/** Hashes a secret at a cost, or tells whether it is the one that was hashed. Takes a third of a second at cost 12. */
export default function run(job: PasswordJob): string | boolean {
  return "hash" in job ? compareSync(job.secret, job.hash) : hashSync(job.secret, job.cost);
}
