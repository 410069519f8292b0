import { buildIfChanged } from "./build.ts";
import { buildFolder } from "./paths.ts";
import { launch } from "./runner.ts";

/** `npm start`: everything that Stillpeg needs, in one process that stops it all again. */
await launch({
  async prepare(signal) {
    if (await buildIfChanged(signal)) console.log("Built from the sources.");
  },
  args: () => [`${buildFolder}/server/serve.js`],
  mode: "production",
});
