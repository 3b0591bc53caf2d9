/** What the address of a page carries, as the framework hands it over. */
export type SearchParams = Promise<Record<string, string | string[] | undefined>>;

export function queryOf(params: Record<string, string | string[] | undefined>): URLSearchParams {
  const query = new URLSearchParams();
  for (const [name, value] of Object.entries(params)) {
    for (const one of Array.isArray(value) ? value : value === undefined ? [] : [value])
      query.append(name, one);
  }
  return query;
}
