import { parseWithZod } from "@conform-to/zod/v4";
import { data, Link, redirect, useSearchParams } from "react-router";
import { ConflictPanel } from "#app/components/conflict-panel.tsx";
import { PostButton } from "#app/components/post-button.tsx";
import { SongForm } from "#app/components/songs/song-form.tsx";
import { SongView } from "#app/components/songs/song-view.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { UndoBar } from "#app/components/undo-bar.tsx";
import { can } from "#app/domain/permissions.ts";
import { differences } from "#app/domain/repertoire/form-differences.ts";
import { readVersion } from "#app/domain/repertoire/form-fields.ts";
import { songFormSchema } from "#app/domain/repertoire/song-form.ts";
import { comparableSong, songFieldLabels, songFormValues } from "#app/domain/repertoire/song-form-values.ts";
import { usualChoices } from "#app/domain/repertoire/usual-choices.ts";
import { findSong, updateSong } from "#app/models/songs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import { songGuitars } from "#app/services/song-page.server.ts";
import type { Route } from "./+types/show";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = ({ data }) => [{ title: `${data?.song.title ?? "Song"} · Stillpeg` }];

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const song = (await findSong(getDb(), member, params.songId)) ?? notFound("song");
  const guitars = await songGuitars(getDb(), member, song);
  return {
    song,
    guitars,
    naming: member.naming,
    mayEdit: can(member.role, "plan"),
  };
}

export async function action({ request, params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const song = (await findSong(getDb(), member, params.songId)) ?? notFound("song");
  const guitars = await songGuitars(getDb(), member, song);
  const form = await request.formData();
  const submission = parseWithZod(form, {
    schema: songFormSchema({ naming: member.naming, guitars }),
  });
  if (submission.status !== "success") {
    const status = submission.status === "error" ? 400 : 200;
    return data({ result: submission.reply(), conflict: null }, { status });
  }
  const restore = form.has("restore");
  const saved = await updateSong(
    getDb(),
    member,
    song.id,
    readVersion(form.get("version")),
    submission.value,
    restore,
  );
  if (saved.outcome === "gone") notFound("song");
  if (saved.outcome === "saved") return redirect(`/songs/${song.id}?saved`);
  const { current } = saved;
  const choices = usualChoices(guitars.filter((guitar) => !guitar.deleted));
  const kept = comparableSong(songFormValues(current, choices, member.naming), guitars);
  const conflict = {
    version: current.version,
    deleted: current.deleted,
    differences: differences(songFieldLabels, kept, comparableSong(submission.payload, guitars)),
  };
  const message = "Not saved yet: somebody else was first. See above.";
  return data({ result: submission.reply({ formErrors: [message] }), conflict }, { status: 409 });
}

export default function ShowSong({ loaderData, actionData }: Route.ComponentProps) {
  const { song, guitars, naming, mayEdit } = loaderData;
  const [search] = useSearchParams();
  const conflict = actionData?.conflict ?? null;
  const address = `/songs/${song.id}`;
  const readOnly = !mayEdit || (song.deleted && !conflict);
  return (
    <>
      {song.deleted && !conflict ? (
        <UndoBar undo={mayEdit ? `${address}/restore` : undefined}>
          {`${song.title} was deleted from the library. Sets in which it stands keep it.`}
        </UndoBar>
      ) : null}
      <PageHead title={song.title} sub={song.credit || undefined}>
        {readOnly ? null : (
          <>
            <PostButton look="quiet" action={`${address}/duplicate`}>
              Duplicate
            </PostButton>
            <PostButton look="quiet" action={`${address}/delete`}>
              Delete
            </PostButton>
          </>
        )}
      </PageHead>
      {conflict ? <ConflictPanel what="song" savedUrl={address} {...conflict} /> : null}
      {readOnly ? (
        <SongView song={song} guitars={guitars} naming={naming} />
      ) : (
        <SongForm
          id={`song-${song.id}-${song.version}`}
          defaultValue={songFormValues(
            song,
            usualChoices(guitars.filter((guitar) => !guitar.deleted)),
            naming,
          )}
          lastResult={actionData?.result}
          guitars={guitars}
          naming={naming}
          version={conflict?.version ?? song.version}
          restore={conflict?.deleted ?? false}
          saveLabel={conflict ? "Save mine" : "Save"}
          status={search.has("saved") ? <Saved /> : null}
        />
      )}
    </>
  );
}

function Saved() {
  return (
    <p role="status" className="flex flex-wrap gap-x-4">
      Saved.
      <Link to="/songs/new" className="underline underline-offset-4">
        Add another song
      </Link>
    </p>
  );
}
