import { KeyTag, type KeyTagProps } from "~/ui/key-tag";
import { Pegged, PegRow } from "~/ui/pegboard";
import { StandingGlyph } from "~/ui/standing-glyph";
import { Shown } from "./piece-section";

const NORTH: readonly KeyTagProps[] = [
  { unit: "T-104", standing: "cleared", why: "3,000 gal, walked 05:20", to: "/pieces?truck=T-104" },
  {
    unit: "T-109",
    standing: "held",
    why: "Since 05:41",
    to: "/pieces?truck=T-109",
    red: [{ id: "1", title: "Float ball missing", where: "Primary shutoff" }],
  },
  { unit: "T-112", standing: "out", why: "Out 05:55, run 31", to: "/pieces?truck=T-112" },
  { unit: "T-118", standing: "limited", why: "No pressure off-load", to: "/pieces?truck=T-118" },
  { unit: "T-120", standing: "walk-due", why: "Last walked yesterday", to: "/pieces?truck=T-120" },
  {
    unit: "T-131",
    standing: "held",
    why: "Since yesterday 16:20",
    red: [
      { id: "1", title: "Sight glass cracked", where: "Rear head, lower" },
      { id: "2", title: "Brake hose chafed through", where: "Axle 2, curb side" },
      { id: "3", title: "Lamp out" },
    ],
  },
];
const MESA: readonly KeyTagProps[] = [
  { unit: "P-7", standing: "cleared", why: "Towed, walked 05:02" },
  {
    unit: "T-214",
    standing: "out",
    why: "Out 05:37, run 14",
    red: [{ id: "1", title: "Hose burst", where: "Reported on the road 07:10" }],
  },
  { unit: "TX-20418", standing: "limited", why: "Vacuum work only where the relief holds 18 inHg" },
];

export function ShowBoard() {
  return (
    <>
      <Shown name="Standings">
        <p className="flex flex-wrap gap-6">
          <StandingGlyph word="cleared" />
          <StandingGlyph word="limited" />
          <StandingGlyph word="held" />
          <StandingGlyph word="walk-due" />
          <StandingGlyph word="out" />
        </p>
      </Shown>
      <div>
        <PegRow yard="North Yard" note="6 trucks">
          {NORTH.map((tag) => (
            <Pegged key={tag.unit}>
              <KeyTag {...tag} />
            </Pegged>
          ))}
        </PegRow>
        <PegRow yard="Mesa Yard" note="3 trucks">
          {MESA.map((tag) => (
            <Pegged key={tag.unit}>
              <KeyTag {...tag} />
            </Pegged>
          ))}
        </PegRow>
      </div>
      <Shown name="The one tag of a review">
        <div className="grid max-w-5xl grid-cols-1 items-start gap-8 sm:grid-cols-2 lg:grid-cols-3">
          <KeyTag
            unit="T-118"
            standing="limited"
            why="No pressure off-load: pressure half not run"
            size="large"
          />
          <KeyTag unit="T-104" standing="cleared" why="Take the key" size="large" />
          <KeyTag
            unit="T-109"
            standing="held"
            why="The key stays on the peg"
            size="large"
            red={[{ id: "1", title: "Float ball missing", where: "Primary shutoff" }]}
          />
        </div>
      </Shown>
    </>
  );
}
