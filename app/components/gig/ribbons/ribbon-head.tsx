import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import type { RibbonLane } from "#app/domain/gig/ribbon.ts";

type RibbonHeadProps = {
  lane: RibbonLane;
  /** Opened by hand, so that it can be folded again. */
  opened: boolean;
  onToggle: (guitarId: string) => void;
};

/** The badge above a ribbon. That of a folded one opens it. */
export function RibbonHead({ lane, opened, onToggle }: RibbonHeadProps) {
  const { guitar } = lane;
  const style = { left: lane.x, width: lane.width };
  const badge = <GuitarBadge shortName={guitar.shortName} shape={guitar.badge} title={guitar.name} />;
  if (!lane.folded && !opened) {
    return (
      <div className="absolute top-0 flex h-9 items-center justify-center" style={style}>
        {badge}
      </div>
    );
  }
  return (
    <button
      type="button"
      className="absolute top-0 flex h-9 items-center justify-center rounded-sm hover:bg-grey-100"
      style={style}
      aria-expanded={!lane.folded}
      aria-label={`Strings of ${guitar.name}`}
      title={lane.folded ? `Show the strings of ${guitar.name}` : `Fold the strings of ${guitar.name}`}
      onClick={() => onToggle(guitar.id)}
    >
      {badge}
    </button>
  );
}
