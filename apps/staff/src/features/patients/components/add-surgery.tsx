"use client";
import { Button, Buttons } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { TextArea, TextInput } from "@withy/ui/text-input";
import { useForm } from "react-hook-form";
import { fieldProblem, problemItems } from "@/api/form-problems";
import { useAddSurgery } from "../hooks/use-add-surgery";
import { type SurgeryOption, surgeryOption } from "../patient-form";

interface Props {
  open: boolean;
  onClose: () => void;
  onAdded: (surgery: SurgeryOption) => void;
}

const empty = { name: "", addressLines: "", postcode: "", phone: "", email: "" };
const idOf = (field: string) => `surgery-${field.split(".")[0]}`;

/** Adds a surgery to the address book without leaving the patient's form. */
export function AddSurgery({ open, onClose, onAdded }: Props) {
  const { register, handleSubmit, reset } = useForm({ defaultValues: empty });
  const add = useAddSurgery();
  const close = () => {
    add.reset();
    onClose();
  };
  const save = handleSubmit((typed) => {
    const input = { ...typed, addressLines: typed.addressLines.split("\n") };
    add.mutate(input, {
      onSuccess: (surgery) => {
        reset(empty);
        add.reset();
        onAdded(surgeryOption(surgery));
      },
    });
  });
  const field = (name: keyof typeof empty) => ({
    id: idOf(name),
    error: fieldProblem(add.error, name),
    ...register(name),
  });
  return (
    <Dialog
      open={open}
      onOpenChange={(isOpen) => !isOpen && close()}
      title="Add a surgery"
      actions={
        <Buttons>
          <Button kind="primary" busy={add.isPending} onClick={save}>
            Add surgery
          </Button>
        </Buttons>
      }
    >
      {add.error !== null && (
        <ErrorSummary errors={problemItems(add.error, idOf)} attempt={add.submittedAt} />
      )}
      <TextInput label="Name of the surgery" {...field("name")} />
      <TextArea label="Address of the surgery" hint="Without the postcode" {...field("addressLines")} />
      <TextInput label="Postcode of the surgery" span="mid" {...field("postcode")} />
      <TextInput label="Phone of the surgery" span="mid" type="tel" {...field("phone")} />
      <TextInput label="E-mail for letters" type="email" {...field("email")} />
    </Dialog>
  );
}
