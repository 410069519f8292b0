import { data, redirect } from "react-router";
import { type PasteAnswer, PasteSongs } from "#app/components/songs/paste-songs.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { assumedSeconds, pasteLimits } from "#app/domain/repertoire/pasted-list.ts";
import { formatDuration, readDuration } from "#app/domain/repertoire/read-duration.ts";
import { songLimits } from "#app/domain/repertoire/song-form.ts";
import { readUsualCode, usualChoices, usualCode } from "#app/domain/repertoire/usual-choices.ts";
import { listGuitars } from "#app/models/guitars.server.ts";
import { listSongs } from "#app/models/songs.server.ts";
import { getDb, transact } from "#app/services/db.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import { keepPasted } from "#app/services/paste-songs.server.ts";
import type { Route } from "./+types/paste";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "Paste a list · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const [guitars, songs] = await Promise.all([listGuitars(getDb(), member), listSongs(getDb(), member)]);
  return {
    naming: member.naming,
    choices: usualChoices(guitars),
    library: songs.map(({ id, title }) => ({ id, title })),
  };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const form = await request.formData();
  const text = String(form.get("text") ?? "");
  const reuse = form.has("reuse");
  const usual = readUsualCode(String(form.get("usual") ?? "")) ?? [...usualChoices([])[0]!.usual];
  const length = String(form.get("length") ?? "").trim() || formatDuration(assumedSeconds);
  const answer: PasteAnswer = {
    text,
    usual: usualCode(usual),
    length,
    errors: {},
    kept: [],
    added: 0,
  };

  const reading = readDuration(length);
  const tooLong = text.length > pasteLimits.characters;
  if (tooLong)
    answer.errors.text = [`This is longer than ${pasteLimits.characters} characters. Paste a part of it.`];
  if (!reading.ok) answer.errors.length = [reading.message];
  else if (reading.seconds < 1 || reading.seconds > songLimits.longestSeconds) {
    answer.errors.length = ["A song is between 1 second and 3 hours long."];
  }
  if (tooLong || !reading.ok || answer.errors.length) return data(answer, { status: 400 });
  if (form.get("step") !== "keep") return data(answer);

  const ticked = new Set(form.getAll("line").map(Number));
  if (ticked.size === 0) {
    answer.errors.text = ["No line is ticked. Tick those to keep."];
    return data(answer, { status: 400 });
  }
  const { kept, added, left } = await transact(getDb(), (trx) =>
    keepPasted(trx, member, {
      text,
      usual,
      seconds: reading.seconds,
      ticked,
      reuse,
    }),
  );
  if (!reuse && left === "") return redirect(`/songs?added=${added}`);
  return data({ ...answer, text: left, kept, added });
}

export default function Paste({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="Paste a list" sub="Nothing is kept before you have seen what was understood." />
      <div className="px-4 py-5 md:px-6">
        <PasteSongs {...loaderData} answer={actionData} />
      </div>
    </>
  );
}
