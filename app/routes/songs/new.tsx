import { parseWithZod } from "@conform-to/zod/v4";
import { data, redirect } from "react-router";
import { SongForm } from "#app/components/songs/song-form.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { songFormSchema } from "#app/domain/repertoire/song-form.ts";
import { emptyWay } from "#app/domain/repertoire/song-form-values.ts";
import { usualChoices } from "#app/domain/repertoire/usual-choices.ts";
import { createSong } from "#app/models/songs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import { songGuitars } from "#app/services/song-page.server.ts";
import type { Route } from "./+types/new";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "New song · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  return {
    guitars: await songGuitars(getDb(), member, null),
    naming: member.naming,
  };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const guitars = await songGuitars(getDb(), member, null);
  const submission = parseWithZod(await request.formData(), {
    schema: songFormSchema({ naming: member.naming, guitars }),
  });
  if (submission.status !== "success") {
    return data({ result: submission.reply() }, { status: submission.status === "error" ? 400 : 200 });
  }
  const id = await createSong(getDb(), member, submission.value);
  return redirect(`/songs/${id}?saved`);
}

export default function NewSong({ loaderData, actionData }: Route.ComponentProps) {
  const { guitars, naming } = loaderData;
  return (
    <>
      <PageHead title="New song" />
      <SongForm
        id="new-song"
        defaultValue={{
          title: "",
          length: "",
          energy: "",
          priority: "",
          ways: [emptyWay(usualChoices(guitars))],
        }}
        lastResult={actionData?.result}
        guitars={guitars}
        naming={naming}
        version={null}
        saveLabel="Add song"
      />
    </>
  );
}
