import { type FormEvent, useState } from "react";
import { useRevalidator } from "react-router";
import { loop } from "~/text/en/loop";
import { standingText } from "~/text/en/ui";
import type { Station } from "~/trade/sheet/check";
import { Button } from "~/ui/button";
import { plainField } from "~/ui/fields/field-shape";
import { SignatureField } from "~/ui/fields/signature-field";
import { Notice } from "~/ui/notice";
import { readWalk } from "./read-walk";
import { type SentWalk, sendWalk } from "./send-walk";
import { StationChecks } from "./station-checks";

interface WalkFormProps {
  truckId: string;
  walkId: string;
  sheetHash: string;
  stations: Station[];
  driver: string;
}

/** The whole sheet on one page, sent as one signed record, its photos after it. */
export function WalkForm({ truckId, walkId, sheetHash, stations, driver }: WalkFormProps) {
  const [sent, setSent] = useState<SentWalk | null>(null);
  const [busy, setBusy] = useState(false);
  const revalidator = useRevalidator();

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    setBusy(true);
    const signedAt = Date.now();
    const walk = await readWalk(form, stations, { walkId, truckId, sheetHash, signedAt });
    const outcome = await sendWalk(walk, signedAt);
    setBusy(false);
    setSent(outcome);
    if (outcome.state === "sent") await revalidator.revalidate();
  }

  if (sent?.state === "sent") return <WalkSent sent={sent} stations={stations} />;
  return (
    <section aria-labelledby="sheet">
      <h2 id="sheet" className="mb-4 text-2xl font-bold">
        {loop.walk.sheet}
      </h2>
      <form onSubmit={submit} className="space-y-8">
        {stations.map((station) => (
          <StationChecks key={station.key} station={station} />
        ))}
        <SignatureField
          field={plainField("signature", { id: "walk-signature" })}
          wording={loop.walk.certify}
          signer={driver}
        />
        {sent?.state === "refused" && (
          <Notice tone="stop" title={loop.walk.refused} announce="now">
            <ul>
              {sent.faults.map((fault) => (
                <li key={fault}>{fault}</li>
              ))}
            </ul>
          </Notice>
        )}
        {sent?.state === "no-signal" && (
          <Notice tone="stop" announce="now">
            <p>{loop.walk.offline}</p>
          </Notice>
        )}
        <Button type="submit" kind="main" size="walk" wide busy={busy && loop.walk.sending}>
          {loop.walk.sign}
        </Button>
      </form>
    </section>
  );
}

function WalkSent({
  sent,
  stations,
}: {
  sent: Extract<SentWalk, { state: "sent" }>;
  stations: Station[];
}) {
  const missing = stations.flatMap((station) =>
    station.checks
      .filter((check) => sent.missing.includes(check.key))
      .map((check) => `${station.label}: ${check.label}`),
  );
  return (
    <section aria-labelledby="sent">
      <Notice announce tone={missing.length > 0 ? "limit" : "good"}>
        <h2 id="sent" className="font-bold">
          {loop.walk.receipt(standingText[sent.standing])}
        </h2>
        {missing.length > 0 && (
          <>
            <p>{loop.walk.incomplete(missing.length)}</p>
            <ul className="list-disc pl-5">
              {missing.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          </>
        )}
        {sent.photosLost > 0 && <p>{loop.walk.photoNotSent}</p>}
      </Notice>
    </section>
  );
}
