import { useState } from "react";
import { Button } from "~/ui/button";
import { AlertDialog, Dialog } from "~/ui/dialog";
import { ComboboxField } from "~/ui/fields/combobox-field";
import { plainField } from "~/ui/fields/field-shape";
import { Menu } from "~/ui/menu";

const trucks = [
  "T-104",
  "T-109",
  "T-112",
  "T-118",
  "T-120",
  "T-131",
  "T-203",
  "T-207",
  "T-211",
  "P-7",
].map((unit) => ({ value: unit.toLowerCase(), label: unit }));

export function ShowOverlays() {
  const [open, setOpen] = useState<"dialog" | "alert" | null>(null);
  const close = () => setOpen(null);
  return (
    <>
      <div className="flex flex-wrap gap-3">
        <Button onClick={() => setOpen("dialog")}>Open a dialog</Button>
        <Button onClick={() => setOpen("alert")}>Ask once more</Button>
        <Menu
          label="More for T-118"
          items={[
            { key: "print", label: "Print the sheet", to: "/pieces?print" },
            { key: "move", label: "Move to another yard", onSelect: () => setOpen("dialog") },
            {
              key: "out",
              label: "Take out of service",
              onSelect: () => setOpen("alert"),
              danger: true,
            },
          ]}
        />
      </div>
      <div className="max-w-sm">
        <ComboboxField
          field={plainField("spare")}
          label="A walked spare"
          hint="Type part of the unit number."
          options={trucks}
        />
      </div>
      <Dialog
        open={open === "dialog"}
        onClose={close}
        title="Who to call for T-109"
        actions={<Button kind="main">Call the certifier</Button>}
      >
        <p>On call this morning: J. Pruitt. After 06:00 the shop is open.</p>
      </Dialog>
      <AlertDialog
        open={open === "alert"}
        onClose={close}
        title="Take T-118 out of service"
        actions={
          <>
            <Button kind="danger" onClick={close}>
              Take it out of service
            </Button>
            <Button onClick={close}>Keep it in service</Button>
          </>
        }
      >
        <p>Its key stays on the peg and it leaves tomorrow's list. Its tags stay open.</p>
      </AlertDialog>
    </>
  );
}
