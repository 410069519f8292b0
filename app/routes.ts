import { index, layout, type RouteConfig, route } from "@react-router/dev/routes";

const auth = [
  route("sign-up", "routes/auth/sign-up.tsx"),
  route("sign-in", "routes/auth/sign-in.tsx"),
  route("sign-out", "routes/auth/sign-out.tsx"),
  route("join/:token", "routes/auth/join.tsx"),
  route("act/new", "routes/act/new.tsx"),
];

const people = [
  route("people", "routes/people/list.tsx"),
  route("people/links", "routes/people/new-link.tsx"),
  route("people/links/:linkId/revoke", "routes/people/revoke-link.tsx"),
  route("people/:personId/role", "routes/people/role.tsx"),
  route("people/:personId/remove", "routes/people/remove.tsx"),
  route("account", "routes/account/show.tsx"),
  route("account/password", "routes/account/password.tsx"),
  route("account/sessions", "routes/account/sessions.tsx"),
  route("act", "routes/act/edit.tsx"),
  route("act/switch", "routes/act/switch.tsx"),
  route("act/delete", "routes/act/delete.tsx"),
];

const songs = [
  route("songs", "routes/songs/list.tsx"),
  route("songs/new", "routes/songs/new.tsx"),
  route("songs/paste", "routes/songs/paste.tsx"),
  route("songs/:songId", "routes/songs/show.tsx"),
  route("songs/:songId/duplicate", "routes/songs/duplicate.tsx"),
  route("songs/:songId/delete", "routes/songs/delete.tsx"),
  route("songs/:songId/restore", "routes/songs/restore.tsx"),
];

const guitars = [
  route("guitars", "routes/guitars/list.tsx"),
  route("guitars/new", "routes/guitars/new.tsx"),
  route("guitars/:guitarId", "routes/guitars/show.tsx"),
  route("guitars/:guitarId/delete", "routes/guitars/delete.tsx"),
  route("guitars/:guitarId/restore", "routes/guitars/restore.tsx"),
  route("capos/new", "routes/capos/new.tsx"),
  route("capos/:capoId", "routes/capos/show.tsx"),
  route("capos/:capoId/delete", "routes/capos/delete.tsx"),
  route("capos/:capoId/restore", "routes/capos/restore.tsx"),
];

const gigs = [
  route("gigs", "routes/gigs/list.tsx"),
  route("gigs/new", "routes/gigs/new.tsx"),
  route("gigs/:gigId", "routes/gigs/show.tsx"),
  route("gigs/:gigId/duplicate", "routes/gigs/duplicate.tsx"),
  route("gigs/:gigId/delete", "routes/gigs/delete.tsx"),
  route("gigs/:gigId/restore", "routes/gigs/restore.tsx"),
];

const noUi = [
  route("gigs/:gigId/edits", "routes/api/gig-edits.ts"),
  route("gigs/:gigId/stage-sheet.pdf", "routes/api/stage-sheet.ts"),
  route("api/plan", "routes/api/plan.ts"),
  route("api/gigs", "routes/api/gigs.ts"),
  route("api/gigs/:gigId/plan-problem", "routes/api/plan-problem.ts"),
  route("api/health", "routes/api/health.ts"),
  route("api/*", "routes/api/not-found.ts"),
];

/** Every address of Stillpeg. Pages for members stand inside the rail. */
export default [
  index("routes/home.tsx"),
  ...auth,
  layout("routes/member-layout.tsx", [...people, ...songs, ...guitars, ...gigs]),
  ...noUi,
  route("*", "routes/not-found.tsx"),
] satisfies RouteConfig;
