import { buildIfChanged } from "#app/launch/build.ts";

/** The browser tests look at what people get: the built application. */
export default async function startBuild() {
  await buildIfChanged();
}
