import { createContext } from "react-router";

/** The address a request came from, as far as the proxies in front are trusted. Set by the server for each request. */
export const clientIpContext = createContext<string>("unknown");
