import { data } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { frameOf } from "~/auth/frame-of";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { acknowledge, acknowledgeSchema } from "~/domain/acknowledgements/acknowledge";
import { readBrief, truckByUnit } from "~/domain/brief/read-brief";
import { sheetForTruck } from "~/domain/sheets/sheet-for-truck";
import { reasonText } from "~/text/en/gate";
import { loop } from "~/text/en/loop";
import { refusalText } from "~/text/en/refusals";
import { dueChecks } from "~/trade/sheet/due-checks";
import { KeyTag } from "~/ui/key-tag";
import { Notice } from "~/ui/notice";
import { PlaceFrame } from "~/ui/place-frame";
import type { Route } from "./+types/walk";
import { Brief } from "./brief";
import { WalkForm } from "./walk-form";

async function truckOf({ context, params }: Route.LoaderArgs | Route.ActionArgs) {
  const actor = requirePermission(context, "walk.sign");
  const truck = await truckByUnit(dbOf(context), actor.carrierId, params.unit);
  if (!truck) throw data({ code: "not-found" }, { status: 404 });
  return { actor, truck };
}

export async function loader(args: Route.LoaderArgs) {
  const { actor, truck } = await truckOf(args);
  const db = dbOf(args.context);
  const brief = await readBrief(db, actor, truck.id);
  const made = await sheetForTruck(db, actor, truck.id);
  if (!made.ok) throw data({ code: "not-found" }, { status: 404 });
  const { sheet, hash } = made.value;
  const due = new Set(dueChecks(sheet, { walkKind: "before" }).map((check) => check.key));
  const stations = sheet.stations
    .map((station) => ({ ...station, checks: station.checks.filter(({ key }) => due.has(key)) }))
    .filter((station) => station.checks.length > 0);
  return {
    frame: frameOf(args.context),
    truck,
    brief,
    stations,
    sheetHash: hash,
    walkId: uuidv7(),
    acknowledgementId: uuidv7(),
    driver: actor.name,
  };
}

export async function action(args: Route.ActionArgs) {
  const { actor, truck } = await truckOf(args);
  const form = await args.request.formData();
  const note = String(form.get("note") ?? "").trim();
  const parsed = acknowledgeSchema.safeParse({
    id: form.get("id"),
    truckId: truck.id,
    items: form.getAll("item"),
    satisfied: form.get("intent") !== "not-satisfied",
    disputesSignOffId: form.get("disputes") || null,
    note: note === "" ? null : note,
    signature: { name: form.get("signature"), wording: "acknowledgement" },
  });
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    return data({ fault: refusalText.field(issue?.message ?? "invalid") }, { status: 400 });
  }
  const done = await acknowledge(dbOf(args.context), actor, parsed.data);
  if (!done.ok) return data({ fault: refusalText.title(done.refusal.code) }, { status: 409 });
  return data({ fault: null });
}

export default function Walk({ loaderData, actionData }: Route.ComponentProps) {
  const { truck, brief, frame } = loaderData;
  const [first] = brief.standing.reasons;
  return (
    <PlaceFrame frame={frame}>
      <div className="mx-auto max-w-xl space-y-8">
        <KeyTag
          unit={truck.unitNumber}
          standing={brief.standing.word}
          why={first && reasonText(first).why}
          size="large"
          heading="h1"
        />
        {actionData?.fault && (
          <Notice tone="stop" announce="now">
            <p>{actionData.fault}</p>
          </Notice>
        )}
        <Brief
          key={loaderData.acknowledgementId}
          brief={brief}
          id={loaderData.acknowledgementId}
          driver={loaderData.driver}
        />
        <WalkForm
          key={truck.id}
          truckId={truck.id}
          walkId={loaderData.walkId}
          sheetHash={loaderData.sheetHash}
          stations={loaderData.stations}
          driver={loaderData.driver}
        />
      </div>
    </PlaceFrame>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${params.unit} · ${loop.walk.title} · ${loop.product}` },
];
