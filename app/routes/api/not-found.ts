function notFound() {
  return Response.json({ message: "There is nothing at this address." }, { status: 404 });
}

export const loader = notFound;
export const action = notFound;
