import { redirect } from "react-router";
import { Landing } from "#app/components/landing/landing.tsx";
import { personContext } from "#app/services/member.server.ts";
import type { Route } from "./+types/home";

export const meta: Route.MetaFunction = () => [
  { title: "Stillpeg: play many tunings, keep the room" },
  {
    name: "description",
    content:
      "Put a set in the order that needs the least retuning, see what every gap costs, print the stage sheet.",
  },
];

export function loader({ context }: Route.LoaderArgs) {
  if (context.get(personContext)) throw redirect("/gigs");
  return null;
}

export default function Home() {
  return <Landing />;
}
