import { readdirSync } from "node:fs";
import { reactRouter } from "@react-router/dev/vite";
import tailwindcss from "@tailwindcss/vite";
import { defineConfig, type Plugin } from "vite";

/** What runs in threads beside the server: app/workers/planner.node.ts becomes planner.node.js. */
const nodeWorkers = readdirSync("app/workers")
  .filter((file) => file.endsWith(".node.ts"))
  .map((file) => [file.replace(/\.ts$/, ""), `app/workers/${file}`]);

/**
 * One server build with several entries: the pages, the server that serves them, and the workers. The framework names
 * every entry alike; this comes after it and gives each its own name, all in one folder, so that the server finds its
 * workers beside itself.
 */
function serverEntries(): Plugin {
  return {
    name: "stillpeg:server-entries",
    enforce: "post",
    apply: "build",
    configEnvironment(name) {
      if (name !== "ssr") return;
      return {
        build: {
          rollupOptions: {
            input: {
              index: "virtual:react-router/server-build",
              serve: "app/launch/serve.ts",
              ...Object.fromEntries(nodeWorkers),
            },
            output: { entryFileNames: "[name].js", chunkFileNames: "[name]-[hash].js" },
          },
        },
      };
    },
  };
}

export default defineConfig({
  plugins: [tailwindcss(), reactRouter(), serverEntries()],
  resolve: { tsconfigPaths: true },
  worker: { format: "es" },
  // Packages found only when a page asks for them are prepared then, and the first page after a start breaks.
  optimizeDeps: {
    entries: ["app/entry.client.tsx", "app/components/**/*.tsx", "app/workers/*.browser.ts"],
    include: ["@conform-to/react", "@conform-to/zod/v4", "lucide-react"],
    // Routes import these on the server alone; preparing them for the browser would reload the first page.
    exclude: ["knex", "pino", "piscina", "rate-limiter-flexible", "remix-auth", "remix-auth-form"],
  },
});
