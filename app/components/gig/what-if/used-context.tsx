import { createContext, use } from "react";

const UsedContext = createContext<((label: string) => void) | null>(null);

export const UsedProvider = UsedContext.Provider;

/** Tells the list of questions that an answer was used. */
export function useUsed(): (label: string) => void {
  const used = use(UsedContext);
  if (!used) throw new Error("An answer stands outside the questions");
  return used;
}
