import type { Page } from "@withy/contracts/page";
import type { PatientRow } from "@withy/contracts/patients";
import { plainDateWords } from "@withy/core/date-words";
import { get } from "./request";

export interface FoundPatient {
  id: string;
  label: string;
  detail: string;
  href: string;
}

/** The best matches for what was typed, for the palette and for every field that asks for a patient. */
export async function findPatients(text: string, signal?: AbortSignal): Promise<FoundPatient[]> {
  const page = await get<Page<PatientRow>>("/api/patients", { search: text, pageSize: 8 }, signal);
  return page.rows.map((p) => ({
    id: p.id,
    label: p.name,
    detail: [`born ${plainDateWords(p.bornOn)}`, p.phone].filter(Boolean).join(", "),
    href: `/patients/${p.id}`,
  }));
}
