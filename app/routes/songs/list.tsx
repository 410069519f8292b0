import { useDeferredValue, useMemo, useState } from "react";
import { Form, href } from "react-router";
import { BottomActions } from "#app/components/bottom-actions.tsx";
import { LibraryList } from "#app/components/songs/library-list.tsx";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { EmptyState, PageHead } from "#app/components/ui/page.tsx";
import { UndoBar } from "#app/components/undo-bar.tsx";
import { can } from "#app/domain/permissions.ts";
import {
  type LibrarySort,
  libraryRow,
  librarySorts,
  searchLibrary,
  sortLibrary,
} from "#app/domain/repertoire/library.ts";
import { usualChoices } from "#app/domain/repertoire/usual-choices.ts";
import { listGuitars } from "#app/models/guitars.server.ts";
import { findSong, listSongs } from "#app/models/songs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Songs · Stillpeg" }];

const longestQuery = 100;

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const [songs, guitars] = await Promise.all([listSongs(getDb(), member), listGuitars(getDb(), member)]);
  const choices = usualChoices(guitars);
  const asked = url.searchParams.get("sort");
  return {
    rows: songs.map((song) => libraryRow(song, choices, member.naming)),
    query: (url.searchParams.get("q") ?? "").slice(0, longestQuery),
    sort: librarySorts.find((sort) => sort === asked) ?? ("title" as LibrarySort),
    descending: url.searchParams.get("dir") === "down",
    note: await noteOf(url, member),
    naming: member.naming,
    mayEdit: can(member.role, "plan"),
  };
}

/** What the address says was just done, in words; null where nothing was or the act has no such song. */
async function noteOf(url: URL, member: { actId: string }): Promise<{ text: string; undo?: string } | null> {
  const added = Number(url.searchParams.get("added"));
  if (added > 0)
    return {
      text: added === 1 ? "1 song added." : `${Math.floor(added)} songs added.`,
    };
  const id = url.searchParams.get("deleted") ?? url.searchParams.get("restored");
  const song = id ? await findSong(getDb(), member, id) : null;
  if (!song) return null;
  return song.deleted
    ? { text: `${song.title} deleted.`, undo: `/songs/${song.id}/restore` }
    : { text: `${song.title} is back in the library.` };
}

function listUrl(query: string, sort: LibrarySort, descending: boolean): string {
  const search = new URLSearchParams();
  if (query) search.set("q", query);
  if (sort !== "title") search.set("sort", sort);
  if (descending) search.set("dir", "down");
  return search.size > 0 ? `${href("/songs")}?${search}` : href("/songs");
}

export default function Songs({ loaderData }: Route.ComponentProps) {
  const { rows, sort, descending, naming, mayEdit, note } = loaderData;
  const [query, setQuery] = useState(loaderData.query);
  const searched = useDeferredValue(query);
  const shown = useMemo(
    () => sortLibrary(searchLibrary(rows, searched), sort, descending),
    [rows, searched, sort, descending],
  );
  const search = (typed: string) => {
    setQuery(typed);
    window.history.replaceState(window.history.state, "", listUrl(typed, sort, descending));
  };

  return (
    <>
      {note ? <UndoBar undo={mayEdit ? note.undo : undefined}>{note.text}</UndoBar> : null}
      <PageHead title="Songs" sub={rows.length > 0 ? counted(rows.length, shown.length) : undefined}>
        {mayEdit && rows.length > 0 ? (
          <span className="hidden gap-2 md:flex">
            <Actions />
          </span>
        ) : null}
      </PageHead>
      {mayEdit && rows.length > 0 ? (
        <BottomActions>
          <Actions />
        </BottomActions>
      ) : null}
      {rows.length === 0 ? (
        <NoSongs mayEdit={mayEdit} />
      ) : (
        <>
          <Form role="search" className="flex gap-2 px-4 py-3 md:px-6">
            <label htmlFor="q" className="sr-only">
              Search songs
            </label>
            <input
              id="q"
              name="q"
              type="search"
              maxLength={longestQuery}
              value={query}
              onChange={(event) => search(event.target.value)}
              placeholder="Title, credit, first line, tuning or key"
              className="min-h-11 w-full max-w-md rounded-sm border border-grey-400 bg-white px-3 [&::-webkit-search-cancel-button]:grayscale"
            />
            {sort !== "title" ? <input type="hidden" name="sort" value={sort} /> : null}
            {descending ? <input type="hidden" name="dir" value="down" /> : null}
            <noscript>
              <Button type="submit">Search</Button>
            </noscript>
          </Form>
          {shown.length > 0 ? (
            <LibraryList
              rows={shown}
              naming={naming}
              mayEdit={mayEdit}
              sort={sort}
              descending={descending}
              sortUrl={(to, down) => listUrl(query, to, down)}
            />
          ) : (
            <EmptyState title={`No song has “${searched}” in it`}>
              <p>Titles, credits, first lines, tunings, capos and keys were searched.</p>
              <Button onClick={() => search("")}>Show all songs</Button>
            </EmptyState>
          )}
        </>
      )}
    </>
  );
}

function Actions() {
  return (
    <>
      <ButtonLink to="/songs/paste">Paste a list</ButtonLink>
      <ButtonLink to="/songs/new" look="primary">
        Add song
      </ButtonLink>
    </>
  );
}

function counted(all: number, shown: number): string {
  const songs = all === 1 ? "1 song" : `${all} songs`;
  return shown === all ? songs : `${shown} of ${songs}`;
}

function NoSongs({ mayEdit }: { mayEdit: boolean }) {
  return (
    <EmptyState title="No songs yet">
      {mayEdit ? (
        <>
          <p>
            Paste your set list, one song a line with its tuning, capo and length, or add songs one by one.
          </p>
          <div className="flex flex-wrap gap-2">
            <ButtonLink to="/songs/paste" look="primary">
              Paste a list
            </ButtonLink>
            <ButtonLink to="/songs/new">Add song</ButtonLink>
          </div>
        </>
      ) : (
        <p>When a performer adds songs, they stand here with tuning, capo and length.</p>
      )}
    </EmptyState>
  );
}
