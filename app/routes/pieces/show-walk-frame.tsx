import { Button } from "~/ui/button";
import { Caution } from "~/ui/caution";
import { Dial } from "~/ui/dial/dial";
import { plainField } from "~/ui/fields/field-shape";
import { StationStrip } from "~/ui/station-strip";
import { WalkFrame } from "~/ui/walk-frame";
import { scales, vacuumMarks, verdict } from "./show-dial";
import { strip } from "./show-walk";

/** A whole walk screen, since a page has one frame. */
export function ShowWalkFrame() {
  return (
    <WalkFrame
      unit="T-118"
      place={
        <>
          Station 8 of 9
          <br />
          Run-up
        </>
      }
      strip={<StationStrip stations={strip("dddddtdn.")} />}
      title="Vacuum relief: gauge when steady"
      actions={
        <>
          <Button size="walk">Problem</Button>
          <Button size="walk" kind="main">
            Heard it open
          </Button>
        </>
      }
    >
      <div className="mb-4">
        <Caution shape="must" title="Stay at the controls">
          People clear of rear and outlet.
        </Caution>
      </div>
      <Dial
        {...scales}
        side="vacuum"
        field={plainField("relief")}
        label="Vacuum relief, gauge when steady"
        marks={vacuumMarks}
        verdict={verdict}
        usual="20.5 to 21.5 inHg"
      />
    </WalkFrame>
  );
}
