import type { Page } from "@withy/contracts/page";
import type {
  AddGpPracticeInput,
  EditPatientInput,
  GetTimelineInput,
  GpPracticeView,
  LookView,
  PatientPage,
  PatientRow,
  PatientView,
  RegisterPatientInput,
  TimelineView,
} from "@withy/contracts/patients";
import { get, write } from "@/api/request";
import { surgeryOption } from "./patient-form";

export const listPatients = (search: string, page: number, signal?: AbortSignal) =>
  get<PatientPage>("/api/patients", { search, page, withTotal: true }, signal);

export const registerPatient = (input: RegisterPatientInput, idempotencyKey: string) =>
  write<PatientRow>("POST", "/api/patients", input, idempotencyKey);

export const editPatient = ({ patientId, ...input }: EditPatientInput) =>
  write<PatientView>("PUT", `/api/patients/${patientId}`, input);

export const getTimeline = (input: GetTimelineInput, signal?: AbortSignal) =>
  get<TimelineView>(
    `/api/patients/${input.patientId}/timeline`,
    { kind: input.kind, before: input.before },
    signal,
  );

export const whoLooked = (patientId: string, page: number, signal?: AbortSignal) =>
  get<Page<LookView>>(`/api/patients/${patientId}/looks`, { page }, signal);

export const addGpPractice = (input: AddGpPracticeInput, idempotencyKey: string) =>
  write<GpPracticeView>("POST", "/api/patients/gp-practices", input, idempotencyKey);

/** Surgeries for a field that asks for one. */
export async function findGpPractices(search: string, signal: AbortSignal) {
  const found = await get<GpPracticeView[]>("/api/patients/gp-practices", { search }, signal);
  return found.map(surgeryOption);
}
