import { NavLink } from "react-router";
import { Mark } from "#app/components/ui/mark.tsx";

const places = [
  { to: "/gigs", label: "Gigs" },
  { to: "/songs", label: "Songs" },
  { to: "/guitars", label: "Guitars" },
  { to: "/people", label: "People" },
  { to: "/account", label: "Account" },
];

/** Where one can go: a rail on the left of a laptop, a row across the top of a phone. */
export function Rail({ displayName, actName }: { displayName: string; actName: string }) {
  return (
    <nav
      aria-label="Main"
      className="on-ebony flex items-center gap-1 overflow-x-auto bg-ebony px-2 text-white md:sticky md:top-0 md:h-dvh md:flex-col md:overflow-visible md:px-0 md:py-5 print:hidden"
    >
      <NavLink to="/gigs" aria-label={`Stillpeg, ${actName}, ${displayName}`} className="p-2 md:mb-4">
        <Mark size={32} />
      </NavLink>
      {places.map((place) => (
        <NavLink
          key={place.to}
          to={place.to}
          className={({ isActive }) =>
            `flex min-h-11 items-center px-2 font-display font-semibold md:w-full md:justify-center md:border-l-2 ${
              isActive ? "border-white text-white underline decoration-2 underline-offset-8 md:no-underline" : "border-transparent text-grey-300 hover:text-white"
            }`
          }
        >
          {place.label}
        </NavLink>
      ))}
    </nav>
  );
}
