import { Link } from "react-router";
import { cautions } from "~/text/en/cautions";
import { safety } from "~/text/en/safety";
import { Caution } from "~/ui/caution";
import { PageFrame, PageTitle } from "~/ui/page-frame";
import type { Route } from "./+types/safety";

/** Public, made at build time: what outranks this product, and every caution in one place. */
export default function Safety() {
  return (
    <PageFrame>
      <PageTitle title={safety.title} lead={safety.lead} />
      <ol className="max-w-prose list-decimal space-y-2 pl-6">
        {safety.first.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ol>
      <h2 className="mb-4 mt-8 text-2xl font-bold">{safety.cautions}</h2>
      <div className="grid gap-3 lg:grid-cols-2">
        {Object.entries(cautions).map(([key, caution]) => (
          <Caution key={key} shape={caution.shape} title={caution.title}>
            {caution.text}
          </Caution>
        ))}
      </div>
      <p className="mt-8">
        <Link to="/" className="underline">
          {safety.home}
        </Link>
      </p>
    </PageFrame>
  );
}

export const meta: Route.MetaFunction = () => [{ title: `${safety.title} · Keypeg` }];
