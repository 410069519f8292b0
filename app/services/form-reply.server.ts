import type { Submission } from "@conform-to/react";
import { data } from "react-router";
import { DatabaseUnavailable } from "#app/services/database-unavailable.server.ts";

type Refusal = { refused: string; status: number; field?: string };

/** The form as it was sent, with what is wrong beside its fields. Passwords are not sent back. */
export function refuseForm<Value>(submission: Submission<Value, string[]>, refusal?: Refusal) {
  const errors = refusal && {
    [refusal.field ? "fieldErrors" : "formErrors"]: refusal.field
      ? { [refusal.field]: [refusal.refused] }
      : [refusal.refused],
  };
  return data(submission.reply({ ...errors, hideFields: ["password", "current"] }), refusal?.status ?? 400);
}

/** Runs a step of a form; where the database is away, a refusal, so that what was typed stays on the page. */
export async function orAway<T>(step: () => Promise<T>): Promise<T | { refused: string; status: 503 }> {
  try {
    return await step();
  } catch (error) {
    if (error instanceof DatabaseUnavailable) return { refused: error.message, status: 503 };
    throw error;
  }
}
