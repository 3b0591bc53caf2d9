/** Apart from the handler, so that whoever only starts or looks does not load the solver. */
export const coverKind = "diary.plan-cover";
