import { Button } from "~/ui/button";
import { TagCard } from "~/ui/tag-card";
import { TagGlyph } from "~/ui/tag-glyph";
import { Shown } from "./piece-section";

export function ShowTags() {
  return (
    <>
      <Shown name="Colors">
        <p className="flex flex-wrap gap-6">
          <TagGlyph colour="red" />
          <TagGlyph colour="yellow" />
          <TagGlyph colour="white" />
        </p>
      </Shown>
      <div className="grid grid-cols-1 items-start gap-5 sm:grid-cols-2 lg:grid-cols-3">
        <TagCard
          colour="red"
          title="Float ball missing"
          where="Primary shutoff"
          since="05:41, R. Calloway"
          photos={2}
          to="/pieces?tag=1"
        />
        <TagCard
          colour="yellow"
          title="Vacuum relief opens at 18.8 inHg"
          where="Vacuum relief, set point 21, band 19 to 23"
          since="yesterday 05:12, M. Sorrel"
          limit="Vacuum work only where the relief holds 18 inHg"
          photos={1}
        >
          <Button>Sign off</Button>
        </TagCard>
        <TagCard
          colour="white"
          title="Camlock ear bent, still locks"
          where="Rear, 3 in"
          since="Nov 24, J. Pruitt"
        />
      </div>
    </>
  );
}
