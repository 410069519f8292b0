/** What a finder's empty hand means to the API: 404 as JSON, the same for what is gone and what is another act's. */
export function apiNotFound(what: string): never {
  throw Response.json(
    { message: `There is no such ${what} in this act. It may have been deleted.` },
    { status: 404 },
  );
}

/** 405 as JSON for a method that an address does not have. */
export function methodNotAllowed(allowed: string): Response {
  return Response.json(
    { message: `This address answers ${allowed} only.` },
    { status: 405, headers: { Allow: allowed } },
  );
}
