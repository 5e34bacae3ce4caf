export type SearchParams = Promise<Record<string, string | string[] | undefined>>;

/** The parameters of a page's address as the browser has them. */
export function parametersOf(given: Awaited<SearchParams>): URLSearchParams {
  const parameters = new URLSearchParams();
  for (const [name, values] of Object.entries(given))
    for (const value of [values ?? []].flat()) parameters.append(name, value);
  return parameters;
}
