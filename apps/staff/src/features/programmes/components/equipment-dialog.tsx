"use client";
import { type Equipment, equipment, equipmentWords } from "@withy/clinical/exercises/exercise";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Dialog } from "@withy/ui/dialog";
import { FieldGroup } from "@withy/ui/field-group";
import { useState } from "react";

/** What the home does not have; lines that need it are swapped, and the clock stays. */
export function EquipmentDialog({
  calledName,
  missing,
  onSave,
  onClose,
}: {
  calledName: string;
  missing: readonly Equipment[];
  onSave: (missing: Equipment[]) => void;
  onClose: () => void;
}) {
  const [absent, setAbsent] = useState<readonly Equipment[]>(missing);
  const toggle = (one: Equipment) =>
    setAbsent((now) => (now.includes(one) ? now.filter((other) => other !== one) : [...now, one]));
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Equipment at home"
      lead="Lines that need what is missing are swapped for their alternative. The time does not change."
      actions={
        <Button kind="primary" onClick={() => onSave(equipment.filter((one) => absent.includes(one)))}>
          Swap what is missing
        </Button>
      }
    >
      <FieldGroup legend={`What ${calledName} does not have`} id="equipment-missing">
        <div className="equipment">
          {equipment.map((one) => (
            <Check key={one} checked={absent.includes(one)} onChange={() => toggle(one)}>
              {equipmentWords[one]}
            </Check>
          ))}
        </div>
      </FieldGroup>
    </Dialog>
  );
}
