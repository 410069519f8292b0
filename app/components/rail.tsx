import { NavLink } from "react-router";
import { Mark } from "#app/components/ui/mark.tsx";

const places = [
  { to: "/gigs", label: "Gigs" },
  { to: "/songs", label: "Songs" },
  { to: "/guitars", label: "Guitars" },
  { to: "/people", label: "People" },
];

type RailProps = { displayName: string; actName: string };

/**
 * Where one can go: a rail on the left of a laptop, a row across the top of a phone. The act's name leads to the account,
 * where one switches between acts.
 */
export function Rail({ displayName, actName }: RailProps) {
  return (
    <nav
      aria-label="Main"
      className="on-ebony flex items-stretch bg-ebony text-white md:sticky md:top-0 md:h-dvh md:flex-col md:py-5 print:hidden"
    >
      <NavLink
        to="/gigs"
        aria-label="Stillpeg"
        className="hidden min-h-11 items-center justify-center md:mb-3 md:flex"
      >
        <Mark size={32} />
      </NavLink>
      <NavLink
        to="/account"
        title={`${actName}, ${displayName}`}
        className={({ isActive }) =>
          `flex min-h-12 min-w-0 flex-1 items-center gap-2 px-3 font-display leading-tight md:order-last md:mt-auto md:min-h-11 md:flex-none md:flex-col md:gap-1 md:border-l-2 md:px-1 md:py-2 md:text-center ${
            isActive ? "border-white text-white" : "border-transparent text-grey-300 hover:text-white"
          }`
        }
      >
        <span className="shrink-0 md:hidden">
          <Mark size={24} />
        </span>
        <span className="truncate font-semibold md:line-clamp-3 md:whitespace-normal md:break-words md:text-sm">
          {actName}
        </span>
        <span className="sr-only md:not-sr-only md:text-sm">Account</span>
      </NavLink>
      {places.map((place) => (
        <NavLink
          key={place.to}
          to={place.to}
          className={({ isActive }) =>
            `flex min-h-12 shrink-0 items-center border-b-2 px-2 font-display font-semibold last:pr-3 md:last:pr-1 md:min-h-11 md:w-full md:justify-center md:border-b-0 md:border-l-2 md:px-1 ${
              isActive ? "border-white text-white" : "border-transparent text-grey-300 hover:text-white"
            }`
          }
        >
          {place.label}
        </NavLink>
      ))}
    </nav>
  );
}
