import { parseWithZod } from "@conform-to/zod/v4";
import { data, redirect } from "react-router";
import { ConflictPanel } from "#app/components/conflict-panel.tsx";
import { CapoForm } from "#app/components/guitars/capo-form.tsx";
import { PostButton } from "#app/components/post-button.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { can } from "#app/domain/permissions.ts";
import { capoFormSchema } from "#app/domain/repertoire/capo-form.ts";
import { differences } from "#app/domain/repertoire/form-differences.ts";
import { readVersion } from "#app/domain/repertoire/form-fields.ts";
import { capoFieldLabels, capoFormValues } from "#app/domain/repertoire/guitar-form-values.ts";
import { findCapo, updateCapo } from "#app/models/capos.server.ts";
import { listGuitars } from "#app/models/guitars.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/show";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = ({ data }) => [{ title: `${data?.capo.name ?? "Capo"} · Stillpeg` }];

/** A deleted capo, and a capo to those who may not change it, is told on the page of guitars. */
export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const capo = (await findCapo(getDb(), member, params.capoId)) ?? notFound("capo");
  if (capo.deleted) throw redirect(`/guitars?capo=${capo.id}`);
  if (!can(member.role, "prepare")) throw redirect("/guitars");
  const guitars = await listGuitars(getDb(), member);
  const strings = Math.max(6, ...guitars.map((guitar) => guitar.strings), ...(capo.strings ?? []));
  return { capo, strings };
}

export async function action({ request, params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  if (!(await findCapo(getDb(), member, params.capoId))) notFound("capo");
  const form = await request.formData();
  const submission = parseWithZod(form, { schema: capoFormSchema() });
  if (submission.status !== "success") {
    const status = submission.status === "error" ? 400 : 200;
    return data({ result: submission.reply(), conflict: null }, { status });
  }
  const version = readVersion(form.get("version"));
  const fields = submission.value;
  const saved = await updateCapo(getDb(), member, params.capoId, version, fields, form.has("restore"));
  if (saved.outcome === "gone") notFound("capo");
  if (saved.outcome === "saved") return redirect(`/guitars?capo=${params.capoId}`);
  const conflict = {
    version: saved.current.version,
    deleted: saved.current.deleted,
    differences: differences(capoFieldLabels, capoFormValues(saved.current), submission.payload),
  };
  const message = "Not saved yet: somebody else was first. See above.";
  return data({ result: submission.reply({ formErrors: [message] }), conflict }, { status: 409 });
}

export default function ShowCapo({ loaderData, actionData }: Route.ComponentProps) {
  const { capo, strings } = loaderData;
  const conflict = actionData?.conflict ?? null;
  const address = `/capos/${capo.id}`;
  return (
    <>
      <PageHead title={capo.name}>
        <PostButton look="quiet" action={`${address}/delete`}>
          Delete
        </PostButton>
      </PageHead>
      {conflict ? <ConflictPanel what="capo" savedUrl={address} {...conflict} /> : null}
      <CapoForm
        id={`capo-${capo.id}-${capo.version}`}
        defaultValue={capoFormValues(capo)}
        lastResult={actionData?.result}
        strings={strings}
        version={conflict?.version ?? capo.version}
        restore={conflict?.deleted ?? false}
        saveLabel={conflict ? "Save mine" : "Save"}
      />
    </>
  );
}
