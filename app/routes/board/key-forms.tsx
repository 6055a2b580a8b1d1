import { Form } from "react-router";
import type { FormFaults } from "~/http/field-faults";
import { loop } from "~/text/en/loop";
import { Button } from "~/ui/button";
import { CheckField } from "~/ui/fields/check-field";
import { ChoiceTiles } from "~/ui/fields/choice-tiles";
import { plainField } from "~/ui/fields/field-shape";
import { SelectField } from "~/ui/fields/select-field";
import { TextAreaField, TextField } from "~/ui/fields/text-field";

const YES_NO = [
  { value: "yes", label: loop.yes },
  { value: "no", label: loop.no },
];

/** The key to a named driver for a run; no need is answered beforehand. */
export function HandOverForm({
  id,
  truckId,
  drivers,
  typed,
  faults,
}: {
  id: string;
  truckId: string;
  drivers: { id: string; name: string }[];
  typed: Record<string, string>;
  faults: FormFaults;
}) {
  const field = (name: string) =>
    plainField(name, { value: typed[name] ?? "", errors: faults[name] });
  const people = drivers.map((driver) => ({ value: driver.id, label: driver.name }));
  return (
    <Form method="post" className="space-y-4" aria-label={loop.board.handOver}>
      <h2 className="text-xl font-bold">{loop.board.handOver}</h2>
      <input type="hidden" name="id" value={id} />
      <input type="hidden" name="truckId" value={truckId} />
      <SelectField
        field={field("driverId")}
        label={loop.board.driver}
        options={[{ value: "", label: "–" }, ...people]}
      />
      <TextField field={field("runName")} label={loop.board.run} />
      <h3 className="font-bold">{loop.board.needs}</h3>
      <ChoiceTiles
        field={field("pressure")}
        label={loop.board.pressure}
        choices={YES_NO}
        columns={2}
      />
      <ChoiceTiles field={field("towing")} label={loop.board.towing} choices={YES_NO} columns={2} />
      <ChoiceTiles field={field("hazmat")} label={loop.board.hazmat} choices={YES_NO} columns={2} />
      <TextField field={field("vacuum")} label={loop.board.vacuum} inputMode="decimal" />
      <TextField field={field("fill")} label={loop.board.fill} inputMode="decimal" />
      <TextField field={field("hose")} label={loop.board.hose} inputMode="decimal" />
      <Button type="submit" kind="main" name="intent" value="hand-over">
        {loop.board.handOver}
      </Button>
    </Form>
  );
}

/** The key comes back to its peg. */
export function TakeBackForm({
  id,
  handoverId,
  typed,
  faults,
}: {
  id: string;
  handoverId: string;
  typed: Record<string, string>;
  faults: FormFaults;
}) {
  const field = (name: string) =>
    plainField(name, { value: typed[name] ?? "", errors: faults[name] });
  return (
    <Form method="post" className="space-y-4" aria-label={loop.board.takeBack}>
      <h2 className="text-xl font-bold">{loop.board.takeBack}</h2>
      <input type="hidden" name="id" value={id} />
      <input type="hidden" name="handoverId" value={handoverId} />
      <ChoiceTiles
        field={field("aboard")}
        label={loop.board.aboard}
        choices={[
          { value: "empty", label: loop.board.empty },
          { value: "loaded", label: loop.board.loaded },
        ]}
        columns={2}
      />
      <TextField
        field={field("pumpHours")}
        label={loop.board.pumpHours}
        inputMode="decimal"
        optional
      />
      <CheckField field={field("endsDay")} label={loop.board.endsDay} />
      <TextAreaField field={field("note")} label={loop.board.note} optional />
      <Button type="submit" kind="main" name="intent" value="take-back">
        {loop.board.takeBack}
      </Button>
    </Form>
  );
}
