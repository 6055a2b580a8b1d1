import { frameOf } from "~/auth/frame-of";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { type BoardTruck, readBoard } from "~/domain/board/read-board";
import { reasonText, tagTitle } from "~/text/en/gate";
import { loop } from "~/text/en/loop";
import { EmptyState } from "~/ui/empty-state";
import { KeyTag } from "~/ui/key-tag";
import { PageTitle } from "~/ui/page-frame";
import { Pegged, PegRow } from "~/ui/pegboard";
import { PlaceFrame } from "~/ui/place-frame";
import { Time } from "~/ui/time";
import type { Route } from "./+types/board";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "board.read");
  return { frame: frameOf(context), board: await readBoard(dbOf(context), actor) };
}

function why(truck: BoardTruck): string | undefined {
  if (truck.out) return loop.board.outWith(truck.out.driver, truck.out.runName);
  // A red tag hangs on the key and says so itself.
  const [first] = truck.detail.reasons.filter(
    (reason) => reason.code !== "red-tag" || !truck.tags.some((tag) => tag.id === reason.id),
  );
  if (truck.standing === "held" && truck.detail.reasons[0] !== first) return undefined;
  if (first) return reasonText(first).why;
  const names = truck.walkedBy.map((walker) => walker.name).join(", ");
  return names ? loop.board.walkedBy(names) : undefined;
}

export default function Board({ loaderData }: Route.ComponentProps) {
  const { frame, board } = loaderData;
  const zone = board.yards[0]?.zone;
  return (
    <PlaceFrame frame={frame} wide>
      <PageTitle
        title={loop.board.title}
        lead={
          zone && (
            <>
              {loop.board.asOf} <Time at={board.asOf} zone={zone} />
            </>
          )
        }
      />
      {board.yards.length === 0 && <EmptyState title={loop.board.none} />}
      {board.yards.map((yard) => (
        <PegRow key={yard.id} yard={yard.name} note={loop.board.trucks(yard.trucks.length)}>
          {yard.trucks.map((truck) => (
            <Pegged key={truck.id}>
              <KeyTag
                unit={truck.unitNumber}
                standing={truck.standing}
                why={why(truck)}
                to={`/board/${truck.unitNumber}`}
                heading="h3"
                red={truck.tags
                  .filter((tag) => tag.colour === "red")
                  .map(({ id, title }) => ({ id, title: tagTitle(title) }))}
              />
            </Pegged>
          ))}
        </PegRow>
      ))}
    </PlaceFrame>
  );
}

export const meta: Route.MetaFunction = () => [{ title: `${loop.board.title} · ${loop.product}` }];
