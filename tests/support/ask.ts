import type { RouteConfigEntry } from "@react-router/dev/routes";
import {
  createRequestHandler,
  RouterContextProvider,
  type ServerBuild,
  UNSAFE_withComponentProps as withComponentProps,
  UNSAFE_withErrorBoundaryProps as withErrorBoundaryProps,
} from "react-router";
import config from "#app/../react-router.config.ts";
import * as entry from "#app/entry.server.tsx";
import * as root from "#app/root.tsx";
import routeConfig from "#app/routes.ts";
import { clientIpContext } from "#app/services/client-ip.server.ts";

type Routes = ServerBuild["routes"];
type Route = NonNullable<Routes[string]>;

/** Gives a page its loaderData, params and the rest, as the framework's own build does. */
function withProps(module: Record<string, unknown>): Route["module"] {
  const page = module.default as Parameters<typeof withComponentProps>[0];
  const boundary = module.ErrorBoundary as Parameters<typeof withErrorBoundaryProps>[0];
  return {
    ...module,
    ...(page ? { default: withComponentProps(page) } : {}),
    ...(boundary ? { ErrorBoundary: withErrorBoundaryProps(boundary) } : {}),
  } as Route["module"];
}

async function addRoutes(
  entries: readonly RouteConfigEntry[],
  parentId: string,
  into: Routes,
): Promise<Routes> {
  for (const { file, path, index, children } of entries) {
    const id = file.replace(/\.tsx?$/, "");
    const module = await import(/* @vite-ignore */ new URL(`../../app/${file}`, import.meta.url).pathname);
    into[id] = { id, parentId, path, index, module: withProps(module) };
    await addRoutes(children ?? [], id, into);
  }
  return into;
}

/** What the build would tell browsers of a route. */
function manifestOf({ id, parentId, path, index, module }: Route) {
  return {
    id,
    parentId,
    path,
    index,
    module: `/${id}.js`,
    imports: [],
    hasLoader: module.loader !== undefined,
    hasAction: module.action !== undefined,
    hasErrorBoundary: module.ErrorBoundary !== undefined,
    hasClientLoader: false,
    hasClientAction: false,
    hasClientMiddleware: false,
    clientActionModule: undefined,
    clientLoaderModule: undefined,
    clientMiddlewareModule: undefined,
    hydrateFallbackModule: undefined,
  };
}

async function makeHandler() {
  const routes = await addRoutes(await routeConfig, "root", {
    root: { id: "root", path: "", module: withProps(root) },
  });
  const manifest = Object.fromEntries(Object.entries(routes).map(([id, route]) => [id, manifestOf(route!)]));
  const build: ServerBuild = {
    entry: { module: entry as ServerBuild["entry"]["module"] },
    routes,
    assets: {
      entry: { module: "/entry.js", imports: [] },
      routes: manifest,
      url: "/manifest.js",
      version: "tests",
    },
    future: config.future as ServerBuild["future"],
    allowedActionOrigins: config.allowedActionOrigins,
    publicPath: "/",
    assetsBuildDirectory: "build/client",
    basename: "/",
    ssr: true,
    isSpaMode: false,
    prerender: [],
    routeDiscovery: { mode: "initial", manifestPath: "/__manifest" },
  };
  return createRequestHandler(build, "production");
}

export type Address = { path: string; reads: boolean; writes: boolean };

/** Every address of the application, and whether it answers to reading and to posting. */
export async function listAddresses(): Promise<Address[]> {
  const routes = await addRoutes(await routeConfig, "root", {});
  return Object.values(routes)
    .filter((route) => route?.path && !route.path.includes("*"))
    .map((route) => ({
      path: `/${route!.path}`,
      reads: route!.module.loader !== undefined || route!.module.default !== undefined,
      writes: route!.module.action !== undefined,
    }));
}

let handler: ReturnType<typeof makeHandler> | null = null;

type Ask = {
  method?: string;
  /** Sent as a browser sends a form of this site. */
  form?: Record<string, string>;
  body?: string;
  headers?: Record<string, string>;
  cookie?: string;
  /** The address the request comes from. */
  ip?: string;
};

export const appOrigin = "http://127.0.0.1:4780";

/**
 * One request through the whole application as it is put together from its routes: middleware, loaders, actions and
 * rendering, in this process, with no browser and no scripts.
 */
export async function ask(path: string, { method, form, body, headers, cookie, ip = "192.0.2.1" }: Ask = {}) {
  handler ??= makeHandler();
  const context = new RouterContextProvider();
  context.set(clientIpContext, ip);
  const request = new Request(new URL(path, appOrigin), {
    method: method ?? (form ? "POST" : "GET"),
    headers: {
      ...(form ? { "Sec-Fetch-Site": "same-origin", Origin: appOrigin } : {}),
      ...(cookie ? { Cookie: cookie } : {}),
      ...headers,
    },
    body: form ? new URLSearchParams(form) : body,
  });
  const response = await (await handler)(request, context);
  const setCookie = response.headers.get("Set-Cookie");
  return {
    status: response.status,
    location: response.headers.get("Location"),
    headers: response.headers,
    setCookie,
    /** What a browser would send from now on. */
    cookie: setCookie?.split(";")[0] ?? cookie ?? "",
    text: await response.text(),
  };
}
