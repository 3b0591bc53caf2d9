import type { PatientView } from "@withy/contracts/patients";
import type { LinkTab } from "@withy/ui/tabs";

/** The parts of a record that this person may open. */
export function patientTabs(patient: PatientView, path: string): LinkTab[] {
  const here = `/patients/${patient.id}`;
  const { counts, clinical } = patient;
  const tab = (label: string, part: string, count?: number | null): LinkTab => {
    const href = part === "" ? here : `${here}/${part}`;
    const current = part === "" ? path === here : path === href || path.startsWith(`${href}/`);
    return { href, label, current, ...(count ? { count } : {}) };
  };
  return [
    tab("Timeline", ""),
    ...(clinical === null
      ? []
      : [
          tab("Episodes", "episodes", counts.episodes),
          tab("Measures", "measures", counts.measures),
          tab("Programme", "programme"),
        ]),
    ...(counts.letters === null ? [] : [tab("Letters", "letters", counts.letters)]),
    ...(counts.invoices === null ? [] : [tab("Money", "money", counts.invoices)]),
  ];
}
