import { randomBytes } from "node:crypto";
import type { RequestHandler, Response } from "express";
import helmet from "helmet";

/**
 * Headers that every answer carries. A script runs only where it is a file of ours or carries this answer's nonce, so
 * text that somebody planted on a page stays text; nobody can frame a page to catch its clicks.
 */
export function securityHeaders(publicUrl: string): RequestHandler[] {
  const overTls = publicUrl.startsWith("https:");
  const nonce = (_request: unknown, response: unknown) => `'nonce-${nonceOf(response as Response)}'`;
  const headers = helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        "default-src": ["'self'"],
        "base-uri": ["'self'"],
        "connect-src": ["'self'"],
        "font-src": ["'self'", "data:"],
        "form-action": ["'self'"],
        "frame-ancestors": ["'none'"],
        "img-src": ["'self'", "data:", "blob:"],
        "object-src": ["'none'"],
        "script-src": ["'self'", nonce],
        "script-src-attr": ["'none'"],
        "style-src": ["'self'", nonce],
        "style-src-attr": ["'unsafe-inline'"],
        "worker-src": ["'self'", "blob:"],
        ...(overTls ? { "upgrade-insecure-requests": [] } : {}),
      },
    },
    // With no-referrer, browsers send `Origin: null` with forms, and the check of where a form comes from is blind.
    referrerPolicy: { policy: "same-origin" },
    strictTransportSecurity: overTls ? { maxAge: 31_536_000 } : false,
  });
  const makeNonce: RequestHandler = (_request, response, next) => {
    response.locals.nonce = randomBytes(16).toString("base64url");
    next();
  };
  return [makeNonce, headers];
}

export function nonceOf(response: Response): string {
  return String(response.locals.nonce);
}
