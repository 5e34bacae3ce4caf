/** Calls of the API as a script makes them. */

/** Sends a document, or any text, to be assessed. */
export function postDocument(
  url: string,
  body: unknown,
  headers: Record<string, string> = {},
): Promise<Response> {
  return fetch(`${url}/api/v1/assessments`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', ...headers },
    body: typeof body === 'string' ? body : JSON.stringify(body),
  });
}

/** The value of a parameter of one item of a structured field, such as `r` of `"calls"`. */
export function itemParameter(header: string | null, item: string, parameter: string): number {
  const found = header?.split(', ').find((part) => part.startsWith(`"${item}"`));
  return Number(new RegExp(`;${parameter}=(\\d+)`).exec(found ?? '')?.[1]);
}
