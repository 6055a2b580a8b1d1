import { Form } from "react-router";
import type { BenchTag } from "~/domain/bench/read-bench";
import type { FormFaults } from "~/http/field-faults";
import { benchText } from "~/text/en/bench";
import { limitText, tagTitle } from "~/text/en/gate";
import { Button } from "~/ui/button";
import { CheckField } from "~/ui/fields/check-field";
import { ChoiceTiles } from "~/ui/fields/choice-tiles";
import { plainField } from "~/ui/fields/field-shape";
import { SelectField } from "~/ui/fields/select-field";
import { SignatureField } from "~/ui/fields/signature-field";
import { TextAreaField, TextField } from "~/ui/fields/text-field";
import { Notice } from "~/ui/notice";
import { AS_TAGGED, NO_LIMIT } from "./read-tag-form";

export interface TagFormProps {
  tag: BenchTag & { formId: string };
  signer: string;
  /** Refused as a whole. */
  fault: string | null;
  faults: FormFaults;
  typed: Record<string, string>;
}

function fieldsOf({ tag, faults, typed }: TagFormProps, form: string) {
  return (name: string) =>
    plainField(name, {
      id: `${form}-${name}-${tag.id}`,
      value: typed[name] ?? "",
      errors: faults[name],
    });
}

function TagForm({
  props: { tag, fault },
  intent,
  label,
  children,
}: {
  props: TagFormProps;
  intent: "sign-off" | "allow-run";
  label: string;
  children: React.ReactNode;
}) {
  const name = `${label}: ${tag.unitNumber}, ${tagTitle(tag.title)}`;
  return (
    <Form method="post" preventScrollReset className="mt-3 space-y-4" aria-label={name}>
      <input type="hidden" name="id" value={tag.formId} />
      <input type="hidden" name="tagId" value={tag.id} />
      {fault && (
        <Notice tone="stop" announce="now">
          <p>{fault}</p>
        </Notice>
      )}
      {children}
      <Button type="submit" kind="main" name="intent" value={intent}>
        {label}
      </Button>
    </Form>
  );
}

/** Repaired, or repair not needed: the two ends of a tag. */
export function SignOffForm(props: TagFormProps) {
  const field = fieldsOf(props, "sign-off");
  const works = Object.entries(benchText.works).map(([value, label]) => ({ value, label }));
  return (
    <TagForm props={props} intent="sign-off" label={benchText.signOff}>
      <ChoiceTiles
        field={field("kind")}
        label={benchText.end}
        choices={[
          { value: "repaired", label: benchText.repaired },
          { value: "not-needed", label: benchText.notNeeded },
        ]}
      />
      <SelectField
        field={field("work")}
        label={benchText.work}
        options={[{ value: "", label: "–" }, ...works]}
        optional
      />
      <TextField field={field("parts")} label={benchText.parts} optional />
      <CheckField field={field("roadTested")} label={benchText.roadTested} />
      <TextAreaField field={field("reason")} label={benchText.reason} optional />
      {props.tag.remote && <CheckField field={field("remote")} label={benchText.remote} />}
      <SignatureField
        field={field("signature")}
        wording={benchText.certify}
        signer={props.signer}
      />
    </TagForm>
  );
}

/** A yellow tag's leave to run until a day. */
export function AllowRunForm(props: TagFormProps) {
  const { tag } = props;
  const field = fieldsOf(props, "allow-run");
  const plain = ["no-pressure-off-load", "no-vacuum-work", "no-towing", "no-hazmat"] as const;
  return (
    <TagForm props={props} intent="allow-run" label={benchText.run.title}>
      <SelectField
        field={field("limit")}
        label={benchText.run.limit}
        options={[
          ...(tag.limit
            ? [{ value: AS_TAGGED, label: benchText.run.asTagged(limitText(tag.limit)) }]
            : []),
          { value: NO_LIMIT, label: benchText.run.none },
          ...plain.map((kind) => ({ value: kind, label: limitText({ kind }) })),
          { value: "vacuum-no-deeper", label: benchText.run.vacuum },
          { value: "fill-no-more", label: benchText.run.fill },
          { value: "hose-no-longer", label: benchText.run.hose },
        ]}
      />
      <TextField
        field={field("amount")}
        label={benchText.run.amount}
        hint={benchText.run.amountHint}
        inputMode="decimal"
        optional
      />
      <TextField field={field("untilDay")} label={benchText.run.until} type="date" />
      <SignatureField
        field={field("signature")}
        wording={benchText.run.certify}
        signer={props.signer}
      />
    </TagForm>
  );
}
