import { createContext, use } from "react";

const NonceContext = createContext<string | undefined>(undefined);

/** Hands the page's Content-Security-Policy nonce to the scripts and styles it renders. */
export const NonceProvider = NonceContext.Provider;

/** The nonce on the server; undefined in the browser, which hides nonces from scripts. */
export function useNonce(): string | undefined {
  return use(NonceContext);
}
