/** An expected "no": a stable kind for programs and a sentence that tells a person what to do. */
export interface Refusal {
  readonly kind: string;
  readonly message: string;
  /** The input field that it is about, in the contract's own name. */
  readonly field?: string;
}

export function refusal(kind: string, message: string, field?: string): Refusal {
  return field === undefined ? { kind, message } : { kind, message, field };
}
