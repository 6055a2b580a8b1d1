import { type FieldMetadata, getCollectionProps } from "@conform-to/react";
import { ROLES, type Role } from "~/domain/actor";
import { peopleText } from "~/text/en/people";
import { refusalText } from "~/text/en/refusals";
import { roleText } from "~/text/en/roles";
import { CheckField } from "~/ui/fields/check-field";
import { SelectField } from "~/ui/fields/select-field";

/** A person's place as its form shows it. */
export type ShownPlace = {
  roles: Role[];
  certifier: string | undefined;
  yardId: string;
};

interface PlaceFieldsProps {
  fields: {
    roles: FieldMetadata<Role[]>;
    certifier: FieldMetadata<string | undefined>;
    yardId: FieldMetadata<string>;
  };
  yards: readonly { id: string; name: string }[];
}

/** Roles, certifier and yard: the same fields for inviting and for changing. */
export function PlaceFields({ fields, yards }: PlaceFieldsProps) {
  return (
    <>
      <RolesField field={fields.roles} />
      <CheckField
        field={fields.certifier}
        label={peopleText.certifierLabel}
        hint={peopleText.certifierHint}
      />
      <SelectField
        field={fields.yardId}
        label={peopleText.yard}
        hint={peopleText.yardHint}
        options={[
          { value: "", label: peopleText.allYards },
          ...yards.map((yard) => ({ value: yard.id, label: yard.name })),
        ]}
      />
    </>
  );
}

function RolesField({ field }: { field: FieldMetadata<Role[]> }) {
  const faults = field.allErrors && Object.values(field.allErrors).flat();
  const fault = faults?.[0];
  return (
    <fieldset
      aria-describedby={fault ? `${field.errorId} ${field.descriptionId}` : field.descriptionId}
    >
      <legend className="font-bold">{peopleText.roles}</legend>
      <p id={field.descriptionId} className="text-base text-mute">
        {peopleText.rolesHint}
      </p>
      {getCollectionProps(field, { type: "checkbox", options: [...ROLES] }).map(
        ({ key, ...input }) => {
          const role = input.value as Role;
          return (
            <label key={key} className="mt-2 flex min-h-11 items-center gap-3">
              <input {...input} required={false} className="size-6 shrink-0 accent-enamel" />
              <span>
                <span className="font-bold">{roleText[role]}</span>
                <span className="block text-base text-mute">{peopleText.roleHint[role]}</span>
              </span>
            </label>
          );
        },
      )}
      {fault && (
        <p id={field.errorId} className="mt-1 font-bold text-red">
          {refusalText.field(fault)}
        </p>
      )}
    </fieldset>
  );
}
