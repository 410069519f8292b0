import { parseWithZod } from "@conform-to/zod/v4";
import { data, Link, redirect, useSearchParams } from "react-router";
import { ConflictPanel } from "#app/components/conflict-panel.tsx";
import { GuitarForm } from "#app/components/guitars/guitar-form.tsx";
import { GuitarView } from "#app/components/guitars/guitar-view.tsx";
import { PostButton } from "#app/components/post-button.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { UndoBar } from "#app/components/undo-bar.tsx";
import { can } from "#app/domain/permissions.ts";
import { differences } from "#app/domain/repertoire/form-differences.ts";
import { readVersion } from "#app/domain/repertoire/form-fields.ts";
import { guitarFormSchema } from "#app/domain/repertoire/guitar-form.ts";
import {
  comparableGuitar,
  guitarFieldLabels,
  guitarFormValues,
} from "#app/domain/repertoire/guitar-form-values.ts";
import { findGuitar, listGuitars, updateGuitar } from "#app/models/guitars.server.ts";
import { getDb, transact } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/show";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = ({ data }) => [
  { title: `${data?.guitar.name ?? "Guitar"} · Stillpeg` },
];

async function othersOf(member: { actId: string }, id: string): Promise<{ id: string; name: string }[]> {
  const guitars = await listGuitars(getDb(), member);
  return guitars.filter((guitar) => guitar.id !== id).map((guitar) => ({ id: guitar.id, name: guitar.name }));
}

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const guitar = (await findGuitar(getDb(), member, params.guitarId)) ?? notFound("guitar");
  const others = await othersOf(member, guitar.id);
  return { guitar, others, naming: member.naming, mayEdit: can(member.role, "prepare") };
}

export async function action({ request, params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  const guitar = (await findGuitar(getDb(), member, params.guitarId)) ?? notFound("guitar");
  const others = await othersOf(member, guitar.id);
  const form = await request.formData();
  const schema = guitarFormSchema({ naming: member.naming, others: others.map(({ id }) => id) });
  const submission = parseWithZod(form, { schema });
  if (submission.status !== "success") {
    const status = submission.status === "error" ? 400 : 200;
    return data({ result: submission.reply(), conflict: null }, { status });
  }
  const version = readVersion(form.get("version"));
  const fields = submission.value;
  const saved = await transact(getDb(), (trx) =>
    updateGuitar(trx, member, guitar.id, version, fields, form.has("restore")),
  );
  if (saved.outcome === "gone") notFound("guitar");
  if (saved.outcome === "saved") return redirect(`/guitars/${guitar.id}?saved`);
  if (saved.outcome === "short-name-taken") {
    const message = `${saved.by} has this short name already. Choose another.`;
    const result = submission.reply({ fieldErrors: { shortName: [message] } });
    return data({ result, conflict: null }, { status: 400 });
  }
  const kept = comparableGuitar(guitarFormValues(saved.current, member.naming), others);
  const conflict = {
    version: saved.current.version,
    deleted: saved.current.deleted,
    differences: differences(guitarFieldLabels, kept, comparableGuitar(submission.payload, others)),
  };
  const message = "Not saved yet: somebody else was first. See above.";
  return data({ result: submission.reply({ formErrors: [message] }), conflict }, { status: 409 });
}

export default function ShowGuitar({ loaderData, actionData }: Route.ComponentProps) {
  const { guitar, others, naming, mayEdit } = loaderData;
  const [search] = useSearchParams();
  const conflict = actionData?.conflict ?? null;
  const address = `/guitars/${guitar.id}`;
  const readOnly = !mayEdit || (guitar.deleted && !conflict);
  return (
    <>
      {guitar.deleted && !conflict ? (
        <UndoBar undo={mayEdit ? `${address}/restore` : undefined}>{`${guitar.name} was deleted.`}</UndoBar>
      ) : null}
      <PageHead title={guitar.name}>
        {readOnly ? null : (
          <PostButton look="quiet" action={`${address}/delete`}>
            Delete
          </PostButton>
        )}
      </PageHead>
      {conflict ? <ConflictPanel what="guitar" savedUrl={address} {...conflict} /> : null}
      {readOnly ? (
        <GuitarView
          guitar={guitar}
          spareFor={others.find(({ id }) => id === guitar.spareFor)?.name ?? null}
          naming={naming}
        />
      ) : (
        <GuitarForm
          id={`guitar-${guitar.id}-${guitar.version}`}
          defaultValue={guitarFormValues(guitar, naming)}
          lastResult={actionData?.result}
          others={others}
          naming={naming}
          version={conflict?.version ?? guitar.version}
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
      <Link to="/guitars/new" className="underline underline-offset-4">
        Add another guitar
      </Link>
    </p>
  );
}
