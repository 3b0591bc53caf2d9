import { findExercise, findForm } from "@withy/clinical/exercises/library";

/**
 * The exercises of a programme as a doctor reads them, each once, with how it was last done in brackets:
 * "sit to stand (from a chair, no hands)". An exercise that the library no longer holds is left out.
 */
export function exerciseWords(items: readonly { exercise: string; form: string }[]): string[] {
  const forms = new Map<string, Set<string>>();
  for (const { exercise, form } of items) {
    const name = findExercise(exercise)?.name;
    if (name === undefined) continue;
    const known = forms.get(name) ?? new Set<string>();
    const how = findForm(exercise, form)?.name;
    if (how !== undefined) known.add(how);
    forms.set(name, known);
  }
  return [...forms].map(([name, known]) => {
    const inSentence = name.charAt(0).toLowerCase() + name.slice(1);
    return known.size === 0 ? inSentence : `${inSentence} (${[...known].join("; ")})`;
  });
}
