"use client";
import type { PatientView } from "@withy/contracts/patients";
import { Button, Buttons } from "@withy/ui/button";
import { useEffect, useRef } from "react";
import { formFrom, type PatientForm } from "../patient-form";

const labels: Partial<Record<keyof PatientForm, string>> = {
  givenName: "Given name",
  familyName: "Family name",
  preferredName: "Likes to be called",
  bornOn: "Date of birth",
  phone: "Phone",
  email: "E-mail address",
  addressLines: "Address",
  postcode: "Postcode",
  nhsNumber: "NHS number",
  gpPractice: "GP surgery",
  gpName: "GP's name",
  communicationNeeds: "Communication needs",
  preferredChannel: "Reach the patient by",
  nextOfKin: "Next of kin",
  policyNumber: "Policy number",
  authorisationCode: "Authorisation code",
  sessionsAuthorised: "Sessions authorised",
  excessPence: "Excess",
};

interface Props {
  theirs: PatientView;
  mine: PatientForm;
  onTakeTheirs: () => void;
  onKeepMine: () => void;
}

const words = (value: PatientForm[keyof PatientForm]) =>
  typeof value === "object" && value !== null ? value.label : String(value ?? "") || "empty";

/** Someone else saved first: both versions side by side where they differ, and the choice between them. */
export function TheirVersion({ theirs, mine, onTakeTheirs, onKeepMine }: Props) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => box.current?.focus(), []);
  const other = formFrom(theirs);
  const differing = (Object.keys(labels) as (keyof PatientForm)[]).filter(
    (name) => words(other[name]) !== words(mine[name]),
  );
  return (
    <div className="summary" role="alert" tabIndex={-1} ref={box} aria-labelledby="theirs-title">
      <h2 id="theirs-title" className="text-ui font-ui font-semibold">
        Someone else saved these details while you had them open
      </h2>
      <table className="acc">
        <caption className="vh">Where the two versions differ</caption>
        <thead>
          <tr>
            <th scope="col">Field</th>
            <th scope="col">Theirs</th>
            <th scope="col">Yours</th>
          </tr>
        </thead>
        <tbody>
          {differing.map((name) => (
            <tr key={name}>
              <th scope="row">{labels[name]}</th>
              <td>{words(other[name])}</td>
              <td>{words(mine[name])}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <Buttons>
        <Button onClick={onTakeTheirs}>Start again from theirs</Button>
        <Button onClick={onKeepMine}>Save mine over theirs</Button>
      </Buttons>
    </div>
  );
}
