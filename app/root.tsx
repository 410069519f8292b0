import type { ReactNode } from "react";
import { Links, Meta, Outlet, Scripts, ScrollRestoration } from "react-router";
import "./app.css";
import { ErrorPage } from "#app/components/error-page.tsx";
import { useNonce } from "#app/components/nonce.tsx";
import { csrfMiddleware } from "#app/services/csrf.server.ts";
import { memberMiddleware } from "#app/services/member-middleware.server.ts";
import type { Route } from "./+types/root";

export { shouldRevalidate } from "#app/components/keep-typed.ts";

export const middleware: Route.MiddlewareFunction[] = [csrfMiddleware, memberMiddleware];

/** Without a loader here, the middleware would not run on client navigation. */
export function loader() {
  return null;
}

export const meta: Route.MetaFunction = () => [{ title: "Stillpeg" }];

export const links: Route.LinksFunction = () => [
  { rel: "icon", href: "/favicon.svg", type: "image/svg+xml" },
];

export function Layout({ children }: { children: ReactNode }) {
  const nonce = useNonce();
  return (
    <html lang="en">
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1, viewport-fit=cover" />
        <meta name="theme-color" content="#1b1512" />
        <Meta />
        <Links />
      </head>
      <body>
        {children}
        <ScrollRestoration nonce={nonce} />
        <Scripts nonce={nonce} />
      </body>
    </html>
  );
}

export default function App() {
  return <Outlet />;
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} />;
}
