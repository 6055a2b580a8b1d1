import type { MouseEvent } from "react";
import type { OpenTagFact } from "~/domain/gate/read-facts";
import { walkText } from "~/text/en/walk";
import { cautionBefore } from "~/trade/sheet/caution-before";
import type { Check, Station } from "~/trade/sheet/check";
import { Button } from "~/ui/button";
import { CautionOf } from "~/ui/caution-of";
import { Notice } from "~/ui/notice";
import { CheckAnswer } from "./check-answer";
import { GOOD } from "./read-walk";

/** One press answers every look and level of a station that has no answer yet; drains and numbers never. */
function fillGood(event: MouseEvent<HTMLButtonElement>) {
  const station = event.currentTarget.closest("fieldset");
  for (const select of station?.querySelectorAll("select") ?? []) {
    const takesGood = [...select.options].some((option) => option.value === GOOD);
    if (select.value !== "" || !takesGood || select.dataset.alone !== undefined) continue;
    select.value = GOOD;
    select.dispatchEvent(new Event("change", { bubbles: true }));
  }
}

function startsPressure(checks: readonly Check[], index: number): boolean {
  return checks[index]?.half === "pressure" && checks[index - 1]?.half !== "pressure";
}

/** One station of the sheet: its checks, each after its caution, and one press for "seen, all good". */
export function StationChecks({
  station,
  openTags,
  pressureDue,
}: {
  station: Station;
  openTags: readonly OpenTagFact[];
  pressureDue: boolean;
}) {
  const { checks } = station;
  if (checks.length === 0) return null;
  const looks = checks.some((check) => check.kind === "look" || check.kind === "level");
  return (
    <fieldset className="min-w-0 rounded-lg border-2 border-ink bg-card px-4 pb-4">
      <legend className="px-2 text-xl font-bold">{station.label}</legend>
      <p className="mb-3 text-mute">{station.engine}</p>
      {station.caution && <CautionOf name={station.caution} />}
      <ul>
        {checks.map((check, index) => {
          const caution = cautionBefore(station, index);
          return (
            <li key={check.key} className="mt-4 space-y-3 border-t border-line pt-4">
              {startsPressure(checks, index) && (
                <Notice tone={pressureDue ? "must" : "plain"} title={walkText.half.pressure}>
                  <p>{walkText.pressureWhen[pressureDue ? "due" : "open"]}</p>
                </Notice>
              )}
              {caution && <CautionOf name={caution} />}
              <CheckAnswer check={check} tagged={openTags.some((t) => t.checkKey === check.key)} />
            </li>
          );
        })}
      </ul>
      {looks && (
        <div className="mt-6">
          <Button size="walk" wide onClick={fillGood}>
            {walkText.good}
          </Button>
        </div>
      )}
    </fieldset>
  );
}
