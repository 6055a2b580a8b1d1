import { useEffect, useRef } from "react";
import { standingText } from "~/text/en/ui";
import { walkText } from "~/text/en/walk";
import type { Sheet } from "~/trade/sheet/check";
import { ButtonLink } from "~/ui/button";
import { Notice } from "~/ui/notice";
import type { SentWalk } from "./send-walk";

/** The server's receipt: the standing that followed, and what stops the walk from clearing. */
export function WalkSent({
  sent,
  sheet,
}: {
  sent: Extract<SentWalk, { state: "sent" }>;
  sheet: Sheet;
}) {
  const box = useRef<HTMLElement>(null);
  useEffect(() => box.current?.focus(), []);
  const missing = sheet.stations.flatMap((station) =>
    station.checks
      .filter((check) => sent.missing.includes(check.key))
      .map((check) => `${station.label}: ${check.label}`),
  );
  const clears = sent.clearsNot === null;
  const tone = sent.standing === "held" ? "stop" : clears ? "good" : "limit";
  return (
    <section ref={box} tabIndex={-1} aria-labelledby="sent" className="space-y-4 outline-none">
      <Notice announce tone={tone}>
        <h2 id="sent" className="font-bold">
          {walkText.receipt(standingText[sent.standing])}
        </h2>
        {missing.length > 0 && (
          <>
            <p>{walkText.incomplete(missing.length)}</p>
            <ul className="list-disc pl-5">
              {missing.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          </>
        )}
        {sent.clearsNot && <p>{walkText.clearsNot[sent.clearsNot]}</p>}
        {sent.photosLost > 0 && <p>{walkText.photoNotSent(sent.photosLost)}</p>}
      </Notice>
      <ButtonLink to="/walk">{walkText.another}</ButtonLink>
    </section>
  );
}
