import { Form, redirect } from "react-router";
import { PlainPage } from "#app/components/plain-page.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { personContext } from "#app/services/member.server.ts";
import { endSession } from "#app/services/session.server.ts";
import type { Route } from "./+types/sign-out";

export const meta: Route.MetaFunction = () => [{ title: "Sign out · Stillpeg" }];

export function loader({ context }: Route.LoaderArgs) {
  const person = context.get(personContext);
  if (!person) throw redirect("/");
  return { email: person.email };
}

export async function action({ request }: Route.ActionArgs) {
  throw redirect("/", { headers: { "Set-Cookie": await endSession(request) } });
}

export default function SignOutPage({ loaderData }: Route.ComponentProps) {
  return (
    <PlainPage title="Sign out" sub={`You are signed in as ${loaderData.email}.`}>
      <Form method="post" className="flex flex-col">
        <Button type="submit" look="primary">
          Sign out
        </Button>
      </Form>
    </PlainPage>
  );
}
