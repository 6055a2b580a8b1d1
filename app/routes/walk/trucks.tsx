import { Link } from "react-router";
import { frameOf } from "~/auth/frame-of";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { readBoard } from "~/domain/board/read-board";
import { reasonText } from "~/text/en/gate";
import { loop } from "~/text/en/loop";
import { walkText } from "~/text/en/walk";
import { EmptyState } from "~/ui/empty-state";
import { KeyTag } from "~/ui/key-tag";
import { PageTitle } from "~/ui/page-frame";
import { Pegged, PegRow } from "~/ui/pegboard";
import { PlaceFrame } from "~/ui/place-frame";
import type { Route } from "./+types/trucks";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "walk.sign");
  const board = await readBoard(dbOf(context), actor);
  return {
    frame: frameOf(context),
    yards: board.yards.map((yard) => ({
      id: yard.id,
      name: yard.name,
      trucks: yard.trucks.map(({ id, unitNumber, standing, detail }) => ({
        id,
        unitNumber,
        standing,
        why: detail.reasons[0] ? reasonText(detail.reasons[0]).why : null,
      })),
    })),
  };
}

export default function Trucks({ loaderData }: Route.ComponentProps) {
  const { frame, yards } = loaderData;
  return (
    <PlaceFrame frame={frame}>
      <PageTitle title={walkText.title} lead={walkText.which} />
      {yards.length === 0 && <EmptyState title={walkText.none}>{walkText.noneHow}</EmptyState>}
      {yards.map((yard) => (
        <PegRow key={yard.id} yard={yard.name} note={loop.board.trucks(yard.trucks.length)}>
          {yard.trucks.map((truck) => (
            <Pegged key={truck.id}>
              <KeyTag
                unit={truck.unitNumber}
                standing={truck.standing}
                why={truck.why}
                to={`/walk/${truck.unitNumber}`}
                heading="h3"
              />
            </Pegged>
          ))}
        </PegRow>
      ))}
      <p className="mt-6">
        <Link to="/safety" className="underline">
          {loop.safety}
        </Link>
      </p>
    </PlaceFrame>
  );
}

export const meta: Route.MetaFunction = () => [{ title: `${walkText.title} · ${loop.product}` }];
