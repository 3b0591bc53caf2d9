"use client";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Choice, ManyChoice } from "@withy/ui/choice";
import { Combobox, type ComboboxOption } from "@withy/ui/combobox";
import { DateEntry } from "@withy/ui/date-entry";
import { FieldGroup, FieldRow } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextArea, TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { Section } from "./section";

const today = "2026-12-01";
const people: ComboboxOption[] = [
  { id: "1", label: "Eleri Tamworth", detail: "22 June 1963" },
  { id: "2", label: "Eleanor Tame", detail: "4 May 1990" },
  { id: "3", label: "Hugo Blythe", detail: "17 January 2001" },
];

async function search(text: string): Promise<ComboboxOption[]> {
  return people.filter((person) => person.label.toLowerCase().includes(text.toLowerCase()));
}

const views = ["Day", "Week", "Month"].map((label) => ({ value: label, label }));
const days = ["Mon", "Tue", "Wed", "Thu", "Fri"].map((label) => ({ value: label, label }));

function ButtonsAndKeys() {
  const [view, setView] = useState("Day");
  const [chosen, setChosen] = useState<string[]>(["Tue", "Wed"]);
  return (
    <Section title="Buttons and keys" note="One primary a screen">
      <div className="btns">
        <Button kind="primary" shortcut="B">
          Book next
        </Button>
        <Button shortcut="M">Move</Button>
        <Button kind="stop">Write off £62.00</Button>
        <Button kind="plain">Keep, say why</Button>
        <Button disabled>Sign, when saved</Button>
        <Button size="small">Small</Button>
        <Button busy>Saving</Button>
        <Choice label="View" options={views} value={view} onChange={setView} />
        <ManyChoice label="Days" options={days} value={chosen} onChange={setChosen} />
      </div>
    </Section>
  );
}

/** Buttons, choices and every kind of field, with and without an error. */
export function Controls({ prefix }: { prefix: string }) {
  const [person, setPerson] = useState<ComboboxOption | null>(null);
  const [when, setWhen] = useState("next tue");
  return (
    <>
      <ButtonsAndKeys />
      <Section title="Fields" note="Errors on submit, in the label's words">
        <div className="guide-two">
          <div>
            <TextInput
              id={`${prefix}-name`}
              label="Full name"
              hint="As on the referral"
              defaultValue="Eleri Tamworth"
            />
            <TextInput
              id={`${prefix}-mobile`}
              label="Mobile"
              error="Enter a phone number, or tick that there is none"
              span="mid"
            />
            <FieldRow>
              <Select
                id={`${prefix}-site`}
                label="Site"
                options={["Saltgate", "Tollhouse Lane", "Upper Wharf"].map((s) => ({ value: s, label: s }))}
              />
              <TextInput id={`${prefix}-room`} label="Room" defaultValue="Reed" />
            </FieldRow>
          </div>
          <div>
            <DateEntry id={`${prefix}-when`} label="When" value={when} onChange={setWhen} today={today} />
            <Combobox
              id={`${prefix}-patient`}
              label="Patient"
              value={person}
              onChange={setPerson}
              search={search}
            />
            <FieldGroup legend="Letters by" id={`${prefix}-post`}>
              <Check type="radio" id={`${prefix}-post`} name={`${prefix}-letters`} defaultChecked>
                Post, large print
              </Check>
              <Check type="radio" name={`${prefix}-letters`}>
                E-mail
              </Check>
            </FieldGroup>
            <Check defaultChecked>She agreed to a letter to her GP</Check>
            <TextArea id={`${prefix}-note`} label="Note" ruled defaultValue="Stairs easier with the rail." />
          </div>
        </div>
      </Section>
    </>
  );
}
