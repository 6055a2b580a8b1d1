import { data, Link } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { frameOf } from "~/auth/frame-of";
import { may } from "~/auth/permissions";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { readBoard } from "~/domain/board/read-board";
import { handOver } from "~/domain/handovers/hand-over";
import { takeBack } from "~/domain/handovers/take-back";
import { REFUSAL_STATUS } from "~/domain/refusals";
import { reasonText } from "~/text/en/gate";
import { loop } from "~/text/en/loop";
import { refusalText } from "~/text/en/refusals";
import type { GateReason } from "~/trade/standing/gate";
import { KeyTag } from "~/ui/key-tag";
import { Notice } from "~/ui/notice";
import { PlaceFrame } from "~/ui/place-frame";
import type { Route } from "./+types/truck";
import { HandOverForm, TakeBackForm } from "./key-forms";
import { handOverInput, takeBackInput } from "./read-key-form";

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

export async function action({ context, request }: Route.ActionArgs) {
  const actor = requirePermission(context, "handover.make");
  const form = await request.formData();
  const back = form.get("intent") === "take-back";
  const parsed = back ? takeBackInput(form) : handOverInput(form);
  const typed = Object.fromEntries([...form].map(([name, value]) => [name, String(value)]));
  const empty = { typed, reasons: [] as GateReason[], done: null as "handed" | "back" | null };
  if (!parsed.success) {
    const faults = parsed.error.issues.map((issue) => refusalText.field(issue.message));
    return data({ ...empty, faults }, { status: 400 });
  }
  const db = dbOf(context);
  const result = parsed.back
    ? await takeBack(db, actor, parsed.data)
    : await handOver(db, actor, parsed.data);
  if (result.ok) return data({ ...empty, faults: [], done: back ? "back" : "handed" });
  const { code, reasons = [] } = result.refusal;
  return data(
    { ...empty, faults: [refusalText.title(code)], reasons: reasons as GateReason[] },
    { status: REFUSAL_STATUS[code] },
  );
}

export default function Truck({ loaderData, actionData }: Route.ComponentProps) {
  const { frame, truck, drivers, mayHandOver, formId } = loaderData;
  const reasons = truck.detail.reasons.map(reasonText);
  const [first] = reasons;
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
        </div>
        <div className="space-y-6">
          {actionData?.done && (
            <Notice tone="good" announce>
              <p>{actionData.done === "handed" ? loop.board.handed : loop.board.back}</p>
            </Notice>
          )}
          {actionData && actionData.faults.length > 0 && (
            <Notice tone="stop" title={loop.board.refusedTitle} announce="now">
              {actionData.faults.map((fault) => (
                <p key={fault}>{fault}</p>
              ))}
              <Reasons told={actionData.reasons.map(reasonText)} />
            </Notice>
          )}
          {mayHandOver && truck.out && (
            <TakeBackForm key={formId} id={formId} handoverId={truck.out.handoverId} />
          )}
          {mayHandOver && !truck.out && (
            <HandOverForm
              key={formId}
              id={formId}
              truckId={truck.id}
              drivers={drivers}
              typed={actionData?.done ? {} : (actionData?.typed ?? {})}
            />
          )}
        </div>
      </div>
    </PlaceFrame>
  );
}

function Reasons({ title, told }: { title?: string; told: ReturnType<typeof reasonText>[] }) {
  if (told.length === 0) return null;
  return (
    <section>
      {title && <h2 className="mb-2 text-xl font-bold">{title}</h2>}
      <ul className="space-y-3">
        {told.map(({ why, clears }) => (
          <li key={why} className="border-l-4 border-brass pl-3">
            <p className="font-bold">{why}</p>
            <p>{clears}</p>
          </li>
        ))}
      </ul>
    </section>
  );
}

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${params.unit} · ${loop.board.title} · ${loop.product}` },
];
