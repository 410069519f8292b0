import { Outlet } from "react-router";
import { AwayNotice } from "#app/components/away-notice.tsx";
import { Rail } from "#app/components/rail.tsx";
import { requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/member-layout";

export { shouldRevalidate } from "#app/components/keep-typed.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  return {
    displayName: member.displayName,
    actId: member.actId,
    actName: member.actName,
    role: member.role,
    naming: member.naming,
    hand: member.hand,
    acts: member.acts,
  };
}

export default function MemberLayout({ loaderData }: Route.ComponentProps) {
  return (
    <div className="min-h-dvh md:grid md:grid-cols-[72px_1fr]">
      <Rail displayName={loaderData.displayName} actName={loaderData.actName} />
      <main className="min-w-0 pb-20 md:pb-0">
        <AwayNotice />
        <Outlet />
      </main>
    </div>
  );
}
