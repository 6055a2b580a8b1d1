import { Button, ButtonLink } from "~/ui/button";
import { EmptyState } from "~/ui/empty-state";
import { ErrorState } from "~/ui/error-state";
import { Loading } from "~/ui/loading";
import { Notice } from "~/ui/notice";

export function ShowStates() {
  return (
    <>
      <div className="grid grid-cols-1 gap-4 lg:grid-cols-2">
        <Notice>Kept on this phone: 1 walk, 2 photos. Sends by itself.</Notice>
        <Notice tone="good" title="Inside 19 to 23.">
          Usual here: 20.5 to 21.5.
        </Notice>
        <Notice tone="limit" title="Below the band.">
          A yellow tag goes on: vacuum work only where the relief holds 18 inHg.
        </Notice>
        <Notice
          tone="stop"
          title="Held: float ball missing, primary shutoff."
          action={<Button>Who to call</Button>}
        >
          The key stays on the peg.
        </Notice>
        <Notice tone="must" title="Walk due.">
          The last walk ended with yesterday's work.
        </Notice>
      </div>
      <div className="grid grid-cols-1 items-start gap-4 lg:grid-cols-3">
        <EmptyState
          title="No open tags"
          action={<ButtonLink to="/pieces">See what was signed off</ButtonLink>}
        >
          Every tag on these trucks has been signed off. New ones show here as soon as a walk comes
          in.
        </EmptyState>
        <ErrorState
          title="T-118's standing cannot be worked out"
          next="Keep the key on the peg and call the on-call certifier."
          action={<Button kind="main">Look again</Button>}
        >
          The record of its last walk does not add up.
        </ErrorState>
        <Loading>Fetching the trucks of North Yard</Loading>
      </div>
    </>
  );
}
