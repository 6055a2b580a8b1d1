import { data, Link, useSearchParams } from "react-router";
import { PageFrame, PageTitle } from "~/ui/page-frame";
import type { Route } from "./+types/pieces";
import { pieceMap } from "./piece-map";
import { PieceSection } from "./piece-section";
import { ShowWalkFrame } from "./show-walk-frame";

export function loader(_: Route.LoaderArgs) {
  if (!import.meta.env.DEV && process.env.KEYPEG_PIECES !== "1") {
    throw data({ code: "not-found" }, { status: 404 });
  }
  return null;
}

export default function PiecesPage() {
  const [search] = useSearchParams();
  if (search.get("frame") === "walk") return <ShowWalkFrame />;
  return (
    <PageFrame
      wide
      places={[
        { to: "/pieces", label: "Pieces" },
        { to: "/walk", label: "Walk" },
        { to: "/bench", label: "Bench" },
        { to: "/board", label: "Board" },
        { to: "/office", label: "Office" },
      ]}
      person={{ name: "Odalys Brandt", carrier: "Tallow Creek Liquid Haulage", to: "/account" }}
    >
      <PageTitle
        title="Pieces"
        lead="Every shared piece in every state. The words are filler; the shapes are the product."
      />
      <nav aria-label="Map of the pieces" className="mb-8 border-y border-line py-3">
        <ul className="grid gap-x-8 gap-y-1 sm:grid-cols-2 lg:grid-cols-3">
          {pieceMap.map(({ id, title, files }) => (
            <li key={id}>
              <a href={`#${id}`} className="inline-block py-1 font-bold underline">
                {title}
              </a>
              <span className="block text-sm text-mute">{files}</span>
            </li>
          ))}
          <li>
            <Link to="/pieces?frame=walk" className="inline-block py-1 font-bold underline">
              Frames
            </Link>
            <span className="block text-sm text-mute">
              walk-frame; page-frame is this page's own
            </span>
          </li>
        </ul>
      </nav>
      {pieceMap.map(({ id, title, Show }) => (
        <PieceSection key={id} id={id} title={title}>
          <Show />
        </PieceSection>
      ))}
    </PageFrame>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: "Pieces · Keypeg" },
  { name: "robots", content: "noindex" },
];
