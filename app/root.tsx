import type { ReactNode } from "react";
import { isRouteErrorResponse, Links, Meta, Outlet, Scripts, ScrollRestoration } from "react-router";
import "./app.css";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { useNonce } from "#app/components/nonce.tsx";
import { csrfMiddleware } from "#app/services/csrf.server.ts";
import { memberMiddleware } from "#app/services/member-middleware.server.ts";
import type { Route } from "./+types/root";

export const middleware: Route.MiddlewareFunction[] = [csrfMiddleware, memberMiddleware];

/** Without a loader here, the middleware would not run on client navigation. */
export function loader() {
  return null;
}

export const meta: Route.MetaFunction = () => [{ title: "Stillpeg" }];

export const links: Route.LinksFunction = () => [{ rel: "icon", href: "/favicon.svg", type: "image/svg+xml" }];

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

/** What a person sees where a page cannot be shown: what happened and where to go. Never a stack trace. */
export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  const known = isRouteErrorResponse(error);
  const message =
    known && typeof error.data === "object" && error.data && "message" in error.data
      ? String(error.data.message)
      : known && error.status === 404
        ? "There is nothing at this address."
        : "Something went wrong on our side, and it has been written to the log. Nothing you saved is lost. Try again in a moment.";
  const title = known && error.status === 404 ? "Not here" : known && error.status === 403 ? "Not yours to change" : "This did not work";
  return (
    <main className="mx-auto flex max-w-xl flex-col items-start gap-4 px-6 py-20">
      <h1 className="font-bold text-4xl">{title}</h1>
      <p>{message}</p>
      <ButtonLink to="/" look="primary">
        Go to your gigs
      </ButtonLink>
    </main>
  );
}
