import { type FormEvent, useRef, useState } from "react";
import { useRevalidator } from "react-router";
import { v7 as uuidv7 } from "uuid";
import type { OpenTagFact } from "~/domain/gate/read-facts";
import { walkText } from "~/text/en/walk";
import type { Sheet, WalkKind } from "~/trade/sheet/check";
import { allChecks } from "~/trade/sheet/due-checks";
import { judgeAnswers } from "~/trade/sheet/judge-answers";
import { Button, ButtonLink } from "~/ui/button";
import { plainField } from "~/ui/fields/field-shape";
import { SignatureField } from "~/ui/fields/signature-field";
import { Notice } from "~/ui/notice";
import { LeaveGuard } from "./leave-guard";
import { readWalk, type WalkToSend } from "./read-walk";
import { type SentWalk, sendWalk } from "./send-walk";
import { StationChecks } from "./station-checks";
import { type Gap, WalkGaps } from "./walk-gaps";
import { WalkSent } from "./walk-sent";

export interface WalkFormProps {
  truckId: string;
  kind: WalkKind;
  baseWalkId: string | null;
  walkId: string;
  sheetHash: string;
  sheet: Sheet;
  /** Keys of the checks asked today. */
  due: readonly string[];
  openTags: readonly OpenTagFact[];
  /** The pressure half is asked with this walk, whatever the run. */
  pressureDue: boolean;
  driver: string;
}

function tagsAtChecks(openTags: readonly OpenTagFact[]) {
  return openTags.flatMap(({ checkKey, problemKey, colour, limit }) =>
    checkKey && problemKey ? [{ checkKey, problemKey, colour, limit }] : [],
  );
}

/** The whole sheet on one page, sent as one signed record, its photos after it. */
export function WalkForm(props: WalkFormProps) {
  const { sheet, kind, openTags, driver } = props;
  const [sent, setSent] = useState<SentWalk | null>(null);
  const [gaps, setGaps] = useState<Gap[]>([]);
  const [busy, setBusy] = useState(false);
  const [touched, setTouched] = useState(false);
  const revalidator = useRevalidator();
  // A send that got no answer is repeated byte for byte; any change makes it another record.
  const signed = useRef<{ walk: WalkToSend; at: number } | null>(null);
  const asked = new Set(props.due);
  const checks = allChecks(sheet).filter((check) => asked.has(check.key));

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    const submitter = (event.nativeEvent as SubmitEvent).submitter as HTMLButtonElement | null;
    const asItIs = submitter?.value === "as-it-is";
    setBusy(true);
    const at = signed.current?.at ?? Date.now();
    const about = { ...props, walkId: uuidv7(), signedAt: at };
    const walk = signed.current?.walk ?? (await readWalk(form, checks, about));
    const context = { walkKind: kind, openTags: tagsAtChecks(openTags) };
    const judged = judgeAnswers(sheet, checks, walk.body.answers, context);
    const found = gapsOf(judged.missing, judged.faults, checks);
    setGaps(found);
    if (found.length > 0 && !asItIs) {
      setBusy(false);
      return;
    }
    signed.current = { walk, at };
    const outcome = await sendWalk(walk, at);
    setBusy(false);
    setSent(outcome);
    if (outcome.state === "sent") {
      setTouched(false);
      await revalidator.revalidate();
    }
  }

  if (sent?.state === "sent") return <WalkSent sent={sent} sheet={sheet} />;
  return (
    <section aria-labelledby="sheet">
      <LeaveGuard on={touched} />
      <h2 id="sheet" className="text-2xl font-bold">
        {walkText.sheet}
      </h2>
      <p className="mb-4 text-mute">{walkText.count(checks.length)}</p>
      <form
        onSubmit={submit}
        onChange={() => {
          signed.current = null;
          setTouched(true);
        }}
        className="space-y-8"
      >
        {sheet.stations.map((station) => (
          <StationChecks
            key={station.key}
            station={{ ...station, checks: station.checks.filter(({ key }) => asked.has(key)) }}
            openTags={openTags}
            pressureDue={props.pressureDue}
          />
        ))}
        <SignatureField
          field={plainField("signature", { id: "walk-signature" })}
          wording={kind === "takeover" ? walkText.certifyTakeover : walkText.certify}
          signer={driver}
        />
        <WalkGaps gaps={gaps} />
        {sent?.state === "refused" && (
          <Notice tone="stop" title={walkText.refused} announce="now">
            <ul>
              {sent.faults.map((fault) => (
                <li key={fault}>{fault}</li>
              ))}
            </ul>
          </Notice>
        )}
        {sent?.state === "no-signal" && (
          <Notice tone="stop" announce="now">
            <p>{walkText.offline}</p>
          </Notice>
        )}
        <div className="flex flex-wrap gap-3 *:grow">
          {gaps.length > 0 && (
            <Button type="submit" size="walk" value="as-it-is">
              {walkText.signAnyway}
            </Button>
          )}
          <Button type="submit" kind="main" size="walk" busy={busy && walkText.sending}>
            {walkText.sign}
          </Button>
        </div>
        <p>
          <ButtonLink to="/walk">{walkText.another}</ButtonLink>
        </p>
      </form>
    </section>
  );
}

function gapsOf(
  missing: readonly string[],
  faults: ReturnType<typeof judgeAnswers>["faults"],
  checks: readonly { key: string; label: string }[],
): Gap[] {
  return checks
    .filter(({ key }) => missing.includes(key) || faults.some((fault) => fault.checkKey === key))
    .map(({ key, label }) => {
      const code = faults.find((fault) => fault.checkKey === key)?.code;
      return { key, label, fault: code ? walkText.fault(code) : null };
    });
}
