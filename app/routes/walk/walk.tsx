import { data } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { frameOf } from "~/auth/frame-of";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { acknowledge, acknowledgeSchema } from "~/domain/acknowledgements/acknowledge";
import { readBrief, truckByUnit } from "~/domain/brief/read-brief";
import { REFUSAL_STATUS } from "~/domain/refusals";
import { sheetForTruck } from "~/domain/sheets/sheet-for-truck";
import { reasonText } from "~/text/en/gate";
import { loop } from "~/text/en/loop";
import { refusalText } from "~/text/en/refusals";
import { walkText } from "~/text/en/walk";
import { WALK_KINDS, type WalkKind } from "~/trade/sheet/check";
import { dueChecks } from "~/trade/sheet/due-checks";
import { KeyTag } from "~/ui/key-tag";
import { Notice } from "~/ui/notice";
import { PlaceFrame } from "~/ui/place-frame";
import { Reasons } from "~/ui/reasons";
import type { Route } from "./+types/walk";
import { Brief } from "./brief";
import { WalkForm } from "./walk-form";
import { WalkKinds } from "./walk-kinds";

async function truckOf({ context, params }: Route.LoaderArgs | Route.ActionArgs) {
  const actor = requirePermission(context, "walk.sign");
  const truck = await truckByUnit(dbOf(context), actor.carrierId, params.unit);
  if (!truck) throw data({ code: "not-found" }, { status: 404 });
  return { actor, truck };
}

function kindOf(request: Request): WalkKind {
  const asked = new URL(request.url).searchParams.get("kind");
  return WALK_KINDS.find((kind) => kind === asked) ?? "before";
}

export async function loader(args: Route.LoaderArgs) {
  const { actor, truck } = await truckOf(args);
  const db = dbOf(args.context);
  const kind = kindOf(args.request);
  const brief = await readBrief(db, actor, truck.id);
  const made = await sheetForTruck(db, actor, truck.id);
  if (!made.ok) throw data({ code: "not-found" }, { status: 404 });
  const { sheet, hash } = made.value;
  const { weeklyDue } = brief;
  const due = dueChecks(sheet, { walkKind: kind, weeklyDue, halves: sheet.halves });
  return {
    frame: frameOf(args.context),
    truck,
    kind,
    brief,
    sheet,
    due: due.map((check) => check.key),
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
  const satisfied = form.get("intent") !== "not-satisfied";
  const parsed = acknowledgeSchema.safeParse({
    id: form.get("id"),
    truckId: truck.id,
    items: form.getAll("item"),
    satisfied,
    disputesSignOffId: satisfied ? null : form.get("disputes") || null,
    note: note === "" ? null : note,
    signature: { name: form.get("signature") ?? "", wording: "acknowledgement" },
  });
  if (!parsed.success) {
    const signature = parsed.error.issues.filter((issue) => issue.path[0] === "signature");
    const over = signature.length > 0 ? null : refusalText.title("invalid");
    const typed = { note, disputes: String(form.get("disputes") ?? "") };
    const faults = { signature: signature.length > 0 ? ["signature-empty"] : [] };
    return data({ fault: over, faults, typed }, { status: 400 });
  }
  const done = await acknowledge(dbOf(args.context), actor, parsed.data);
  if (done.ok) return data({ fault: null, faults: null, typed: null });
  const { code } = done.refusal;
  const fault = refusalText.title(code);
  return data({ fault, faults: null, typed: null }, { status: REFUSAL_STATUS[code] });
}

export default function Walk({ loaderData, actionData }: Route.ComponentProps) {
  const { truck, brief, frame, kind } = loaderData;
  const { word, reasons } = brief.standing;
  const told = reasons.map(reasonText);
  return (
    <PlaceFrame frame={frame}>
      <div className="mx-auto max-w-xl space-y-8">
        <KeyTag
          unit={truck.unitNumber}
          standing={word}
          why={told[0]?.why}
          size="large"
          heading="h1"
        />
        <WalkKinds unit={truck.unitNumber} kind={kind} brief={brief} />
        {told.length > 1 && <Reasons title={loop.board.standing} told={told} />}
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
          typed={actionData?.typed ?? null}
          faults={actionData?.faults?.signature ?? []}
        />
        {kind === "takeover" && !brief.base ? (
          <Notice tone="must">{walkText.noBase}</Notice>
        ) : (
          <WalkForm
            key={`${truck.id} ${kind}`}
            truckId={truck.id}
            kind={kind}
            baseWalkId={kind === "takeover" ? (brief.base?.id ?? null) : null}
            walkId={loaderData.walkId}
            sheetHash={loaderData.sheetHash}
            sheet={loaderData.sheet}
            due={loaderData.due}
            openTags={brief.openTags}
            pressureDue={brief.weeklyDue || brief.bothHalves}
            driver={loaderData.driver}
          />
        )}
      </div>
    </PlaceFrame>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${params.unit} · ${walkText.title} · ${loop.product}` },
];
