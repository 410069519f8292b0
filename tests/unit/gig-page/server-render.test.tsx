import { renderToString } from "react-dom/server";
import { MemoryRouter } from "react-router";
import { describe, expect, test } from "vitest";
import { GigPage } from "#app/components/gig/gig-page.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { Role } from "#app/domain/permissions.ts";
import { gigOf, guitar, repertoireOf, song } from "#tests/unit/gig/build-gig.ts";

const repertoire = repertoireOf(
  [
    song("a", "EADGBE", { title: "Harbour Lamps", key: "G" }),
    song("b", "DADGBE", { title: "Low Meadow" }),
    song("c", "CGCFFC capo 3 leave 6", { title: "Quarry Song" }),
  ],
  [
    guitar("alder", { name: "Alder", shortName: "Alder" }),
    guitar("birch", { name: "Birch", shortName: "Birch" }),
  ],
);
const gig = gigOf([
  [
    { song: "a", guitar: "alder" },
    { song: "b", guitar: "alder" },
    { song: "c", guitar: "birch" },
  ],
]);

/** The page as the server sends it, before any script has run. */
function page(role: Role, shown: Gig = gig, naming: "english" | "german" = "english"): string {
  const reader = { personId: "wren", role, naming, hand: "right", paper: "a4" } as const;
  return renderToString(
    <MemoryRouter>
      <GigPage gig={shown} log={[]} repertoire={repertoire} reader={reader} />
    </MemoryRouter>,
  );
}

/** The accessible names of all buttons, in their order. */
function buttons(html: string): string[] {
  return [...html.matchAll(/<button([^>]*)>(.*?)<\/button>/g)].map(([, attributes, content]) => {
    const label = /aria-label="([^"]*)"/.exec(attributes!)?.[1];
    const spoken = content!.replace(/<(\w+)[^>]*aria-hidden="true".*?<\/\1>/g, "").replace(/<[^>]*>/g, "");
    return (label ?? spoken).replaceAll(/\s+/g, " ").trim();
  });
}

describe("the page without JavaScript", () => {
  const html = page("guest");

  test("names every song, and says every gap in a sentence", () => {
    for (const title of ["Harbour Lamps", "Low Meadow", "Quarry Song"]) expect(html).toContain(title);
    expect(html).toContain("String 6 down 2, to D");
    expect(html).toContain("Change to Birch");
  });

  test("has the totals, one heading, the sheet as a link, and ribbons that tell what they show", () => {
    expect(html).toContain("dead air");
    expect(html.match(/<h1/g)).toHaveLength(1);
    expect(html).toContain('href="/gigs/gig/stage-sheet.pdf"');
    expect(html).toContain("Alder: 1 string retuned in 1 gap");
  });

  test("says that suggestions need a script rather than that they are on their way", () => {
    expect(html).toContain("which needs JavaScript");
    expect(html).not.toContain("Looking for less retuning");
  });

  test("names notes as the reader does", () => {
    expect(page("guest", gig, "german")).toContain(">H<");
    expect(html).not.toContain(">H<");
  });
});

describe("buttons are those the role may use", () => {
  const of = (role: Role) => buttons(page(role));
  const any = (names: string[], pattern: RegExp) => names.some((name) => pattern.test(name));

  test.each(["owner", "performer"] as const)("%s plans", (role) => {
    const names = of(role);
    expect(any(names, /^2, move Low Meadow$/)).toBe(true);
    expect(any(names, /^Low Meadow: more$/)).toBe(true);
    expect(any(names, /choose guitar and tuning for Low Meadow/)).toBe(true);
    expect(any(names, /^held first: Harbour Lamps$/)).toBe(true);
    expect(any(names, /^Set 1: more$/)).toBe(true);
    expect(any(names, /^Undo/)).toBe(true);
    expect(page(role)).toContain("Add a song to Set 1");
  });

  test("a tech chooses guitars and writes notes, but neither order nor rules", () => {
    const names = of("tech");
    expect(any(names, /choose guitar and tuning for Low Meadow/)).toBe(true);
    expect(any(names, /^Low Meadow: more$/)).toBe(true);
    expect(any(names, /^Undo/)).toBe(true);
    expect(any(names, /move Low Meadow|^held |^Set 1: more|Gig details/)).toBe(false);
    expect(page("tech")).not.toContain("Add a song to Set 1");
  });

  test("a guest reads", () => {
    const names = of("guest");
    expect(names.filter((name) => / Before (Low Meadow|Quarry Song)/.test(name))).toHaveLength(2);
    expect(any(names, /^\d+, move |^held |: more$|choose guitar|^(Undo|Redo|Add|Use|Free|Gig details)/)).toBe(
      false,
    );
    expect(page("guest")).toContain("Aim: <!-- -->least dead air");
  });
});

test("a gig without songs offers the next step", () => {
  const html = page("owner", gigOf([[]]));
  expect(html).toContain("No songs yet. Add some below, or paste a list.");
  expect(html).toContain("Paste a list");
});
