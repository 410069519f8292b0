import type { Config } from "@react-router/dev/config";

export default {
  ssr: true,
  // services/csrf.server.ts guards every request that changes something. The framework's own check would look at some
  // of them only, and refuse forms behind a proxy that does not pass the public address on.
  allowedActionOrigins: ["**"],
  future: {
    v8_middleware: true,
    v8_passThroughRequests: true,
    v8_splitRouteModules: true,
    v8_trailingSlashAwareDataRequests: true,
    v8_viteEnvironmentApi: true,
  },
} satisfies Config;
