import type { Role } from "#app/domain/permissions.ts";

/** What each role is called and what it may do, in words for people. The rights themselves stand in permissions.ts. */
export const roleWords: Record<Role, { label: string; may: string }> = {
  owner: { label: "Owner", may: "Owners change everything, people and the act itself too." },
  performer: { label: "Performer", may: "Performers change songs, gigs and guitars." },
  tech: {
    label: "Tech",
    may: "Techs change guitars and capos, and choose guitar and tuning for a song in a set.",
  },
  guest: { label: "Guest", may: "Guests see gigs, songs, guitars and sheets, and change nothing." },
};
