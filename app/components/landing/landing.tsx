import { SmallRibbon } from "#app/components/landing/small-ribbon.tsx";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { Mark } from "#app/components/ui/mark.tsx";

const parts = [
  {
    title: "Write tunings as you always do",
    words:
      "CGCFFC, drop D, Eb standard, capo 3 leave 6. Stillpeg says at once what it understood, string by string, and how it sounds.",
  },
  {
    title: "See where the room has to wait",
    words:
      "Every gap in seconds: strings down, strings up, capo on, guitar changed, and what the talk does not cover.",
  },
  {
    title: "Take an order with less retuning",
    words:
      "Your opener, your closer and every rule you set stay. Where an order is proven the least possible, it says so.",
  },
  {
    title: "Print the stage sheet",
    words:
      "Title, tuning, capo and what hands must do, as large as the paper allows. Black and white is enough.",
  },
];

/** What a stranger sees first. */
export function Landing() {
  return (
    <div className="mx-auto flex min-h-dvh max-w-6xl flex-col px-4 md:px-8">
      <header className="flex items-center justify-between gap-4 py-4">
        <p className="inline-flex items-center gap-2.5 font-bold font-display text-2xl">
          <Mark size={32} />
          Stillpeg
        </p>
        <ButtonLink to="/sign-in">Sign in</ButtonLink>
      </header>
      <main className="flex flex-col gap-12 py-8 md:gap-16 md:py-14">
        <div className="grid items-center gap-10 lg:grid-cols-[minmax(0,1fr)_minmax(0,30rem)] lg:gap-16">
          <div className="flex flex-col items-start gap-6">
            <h1 className="text-balance font-bold text-5xl leading-none md:text-6xl">
              Many tunings, little dead air
            </h1>
            <p className="max-w-prose text-lg">
              You play in many tunings, with capos on all strings or on some. Stillpeg keeps your songs, plans
              a set in which few pegs turn between them, and shows what each gap costs while the room waits.
            </p>
            <ButtonLink to="/sign-up" look="primary">
              Start your act
            </ButtonLink>
          </div>
          <SmallRibbon />
        </div>
        <ul className="grid gap-x-10 gap-y-6 border-grey-200 border-t pt-8 sm:grid-cols-2 lg:grid-cols-4">
          {parts.map((part) => (
            <li key={part.title}>
              <h2 className="font-semibold text-xl">{part.title}</h2>
              <p className="text-grey-600">{part.words}</p>
            </li>
          ))}
        </ul>
      </main>
    </div>
  );
}
