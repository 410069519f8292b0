import { createContext } from "react-router";

/** What a page's scripts and styles must carry to run under its Content-Security-Policy; none while developing. */
export const nonceContext = createContext<string | null>(null);
