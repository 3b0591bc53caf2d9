/** One patient in a list or a search. */
export interface PatientRow {
  readonly id: string;
  /** "Eleri Tamworth", as it is read out. */
  readonly name: string;
  readonly preferredName: string | null;
  readonly bornOn: string;
  readonly phone: string | null;
  readonly postcode: string | null;
}
