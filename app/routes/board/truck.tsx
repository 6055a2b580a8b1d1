import { data, Link } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { frameOf } from "~/auth/frame-of";
import { may } from "~/auth/permissions";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { readBoard } from "~/domain/board/read-board";
import { truckByUnit } from "~/domain/brief/read-brief";
import { handOver } from "~/domain/handovers/hand-over";
import { takeBack } from "~/domain/handovers/take-back";
import { REFUSAL_STATUS } from "~/domain/refusals";
import { type FormFaults, faultsOfFields, faultsOfIssues } from "~/http/field-faults";
import { reasonText, warningText } from "~/text/en/gate";
import { loop } from "~/text/en/loop";
import { refusalText } from "~/text/en/refusals";
import type { GateReason } from "~/trade/standing/gate";
import { KeyTag } from "~/ui/key-tag";
import { Notice } from "~/ui/notice";
import { PlaceFrame } from "~/ui/place-frame";
import { Reasons } from "~/ui/reasons";
import type { Route } from "./+types/truck";
import { HandOverForm, TakeBackForm } from "./key-forms";
import { handOverInput, NEED_NAMES, takeBackInput } from "./read-key-form";

export async function loader({ context, params }: Route.LoaderArgs) {
  const actor = requirePermission(context, "board.read");
  const board = await readBoard(dbOf(context), actor);
  const truck = board.yards
    .flatMap((yard) => yard.trucks)
    .find((one) => one.unitNumber === params.unit.toUpperCase());
  if (!truck) throw data({ code: "not-found" }, { status: 404 });
  return {
    frame: frameOf(context),
    truck,
    drivers: board.drivers,
    mayHandOver: may(actor, "handover.make"),
    formId: uuidv7(),
  };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "handover.make");
  const db = dbOf(context);
  if (!(await truckByUnit(db, actor.carrierId, params.unit))) {
    throw data({ code: "not-found" }, { status: 404 });
  }
  const form = await request.formData();
  const back = form.get("intent") === "take-back";
  const parsed = back ? takeBackInput(form) : handOverInput(form);
  const typed = Object.fromEntries([...form].map(([name, value]) => [name, String(value)]));
  const empty = { typed, reasons: [] as GateReason[], faults: {}, fault: null };
  const done = null as "handed" | "back" | null;
  if (!parsed.success) {
    const faults = faultsOfIssues(parsed.error.issues, NEED_NAMES);
    return data({ ...empty, done, faults }, { status: 400 });
  }
  const result = parsed.back
    ? await takeBack(db, actor, parsed.data)
    : await handOver(db, actor, parsed.data);
  if (result.ok) return data({ ...empty, done: back ? ("back" as const) : ("handed" as const) });
  const { code, reasons = [], fields } = result.refusal;
  return data(
    {
      ...empty,
      done,
      faults: fields ? faultsOfFields(fields, NEED_NAMES) : {},
      fault: fields ? null : refusalText.title(code),
      reasons: reasons as GateReason[],
    },
    { status: REFUSAL_STATUS[code] },
  );
}

export default function Truck({ loaderData, actionData }: Route.ComponentProps) {
  const { frame, truck, drivers, mayHandOver, formId } = loaderData;
  const reasons = truck.detail.reasons.map(reasonText);
  const [first] = reasons;
  const typed: Record<string, string> = actionData?.done ? {} : (actionData?.typed ?? {});
  const faults: FormFaults = actionData?.faults ?? {};
  const back = typed.intent === "take-back";
  return (
    <PlaceFrame frame={frame}>
      <p className="mb-4">
        <Link to="/board" className="underline">
          {loop.board.all}
        </Link>
      </p>
      <div className="grid gap-8 lg:grid-cols-2">
        <div className="space-y-6">
          <KeyTag
            unit={truck.unitNumber}
            standing={truck.standing}
            why={truck.out ? loop.board.outWith(truck.out.driver, truck.out.runName) : first?.why}
            size="large"
            heading="h1"
          />
          <Reasons title={loop.board.standing} told={reasons} />
          {truck.detail.warnings.length > 0 && (
            <section>
              <h2 className="mb-2 text-xl font-bold">{loop.board.due}</h2>
              <ul className="list-disc pl-5">
                {truck.detail.warnings.map((kind) => (
                  <li key={kind}>{warningText(kind)}</li>
                ))}
              </ul>
            </section>
          )}
        </div>
        <div className="space-y-6">
          {actionData?.done && (
            <Notice tone="good" announce>
              <p>{actionData.done === "handed" ? loop.board.handed : loop.board.back}</p>
            </Notice>
          )}
          {actionData?.fault && (
            <Notice tone="stop" title={back ? undefined : loop.board.refusedTitle} announce="now">
              {actionData.reasons.length === 0 && <p>{actionData.fault}</p>}
              <Reasons told={actionData.reasons.map(reasonText)} />
            </Notice>
          )}
          {Object.keys(faults).length > 0 && (
            <Notice tone="stop" announce="now">
              <p>{loop.board.typedKept}</p>
            </Notice>
          )}
          {mayHandOver && truck.out && (
            <TakeBackForm
              key={formId}
              id={formId}
              handoverId={truck.out.handoverId}
              typed={back ? typed : {}}
              faults={back ? faults : {}}
            />
          )}
          {mayHandOver && !truck.out && (
            <HandOverForm
              key={formId}
              id={formId}
              truckId={truck.id}
              drivers={drivers}
              typed={back ? {} : typed}
              faults={back ? {} : faults}
            />
          )}
        </div>
      </div>
    </PlaceFrame>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${params.unit} · ${loop.board.title} · ${loop.product}` },
];
