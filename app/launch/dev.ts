import { launch } from "./runner.ts";

/** `npm run dev`: the same database as `npm start`, with the framework's server, which shows a change as it is saved. */
await launch({
  prepare: async () => {},
  args: ({ host, port }) => [
    "node_modules/@react-router/dev/bin.js",
    "dev",
    "--strictPort",
    "--host",
    host,
    "--port",
    String(port),
  ],
  mode: "development",
});
