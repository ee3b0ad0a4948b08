import type { TestPage } from './browser.js';

/** Calls a route as whoever is signed in on the page; gives the body of the answer, and fails where it is refused. */
export async function callFrom(
  { page }: TestPage,
  method: string,
  path: string,
  body: object = {},
): Promise<Record<string, unknown>> {
  const answer = await page.evaluate(
    async ({ method, path, body }) => {
      const token = /(?:^|; )XSRF-TOKEN=([^;]*)/.exec(document.cookie)?.[1] ?? '';
      const response = await fetch(path, {
        method,
        headers: { 'Content-Type': 'application/json', 'X-XSRF-TOKEN': decodeURIComponent(token) },
        body: JSON.stringify(body),
      });
      return { status: response.status, body: response.status === 204 ? {} : await response.json() };
    },
    { method, path, body },
  );
  if (answer.status >= 400) throw new Error(`${method} ${path} was answered ${JSON.stringify(answer)}.`);
  return answer.body as Record<string, unknown>;
}
