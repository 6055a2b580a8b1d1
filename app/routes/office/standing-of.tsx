import { office } from "~/text/en/office";
import type { StandingWord } from "~/trade/standing/standing";
import { StandingGlyph } from "~/ui/standing-glyph";

/** A truck's standing in one word; why it says nothing of walks when it is out of service. */
export function StandingOf({
  standing,
  inService,
}: {
  standing: StandingWord | null;
  inService: boolean;
}) {
  if (!inService) return <span className="text-mute">{office.trucks.outOfService}</span>;
  if (standing === null) return <span className="text-mute">{office.trucks.workingOut}</span>;
  return <StandingGlyph word={standing} />;
}
