import { isRouteErrorResponse, Link } from "react-router";
import { errorText } from "~/text/en/errors";
import { ErrorState } from "./error-state";
import { PageFrame } from "./page-frame";

/** A whole page that could not be shown: what happened, and what to do now. */
export function RootError({ error }: { error: unknown }) {
  const status = isRouteErrorResponse(error) ? error.status : 500;
  const words = status === 403 || status === 404 ? errorText[status] : errorText.other;
  return (
    <PageFrame>
      <title>{`${words.title} · ${errorText.product}`}</title>
      <ErrorState
        heading="h1"
        title={words.title}
        next={words.next}
        action={
          <Link to="/" className="underline">
            {errorText.home}
          </Link>
        }
      />
    </PageFrame>
  );
}
