/** Stands in for the server at the border, which is `fetch`: every request needs an answer, others fail the test. */
import { vi } from 'vitest';

export interface Asked {
  readonly method: string;
  /** Below the API's prefix, with its query. */
  readonly path: string;
  readonly body: unknown;
  readonly headers: Headers;
}

type Answer =
  | { readonly status?: number; readonly body: unknown }
  | ((asked: Asked) => { readonly status?: number; readonly body: unknown });

export interface FakeServer {
  readonly asked: Asked[];
}

/** Answers by `GET /members`; problems are answers with a status from 400. Undone by `vi.unstubAllGlobals`. */
export const fakeServer = (answers: Readonly<Record<string, Answer>>): FakeServer => {
  const asked: Asked[] = [];
  vi.stubGlobal('fetch', async (url: string, init: RequestInit = {}) => {
    const path = url.replace('/api/v1', '');
    const request: Asked = {
      method: init.method ?? 'GET',
      path,
      body: typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : null,
      headers: new Headers(init.headers),
    };
    asked.push(request);
    const answer = answers[`${request.method} ${path}`];
    if (answer === undefined) throw new Error(`Nobody answers ${request.method} ${path}`);
    const { status = 200, body } = typeof answer === 'function' ? answer(request) : answer;
    const type = status < 400 ? 'application/json' : 'application/problem+json';
    return new Response(JSON.stringify(body), { status, headers: { 'content-type': type } });
  });
  return { asked };
};

/** A problem document as the API sends it. */
export const problemBody = (name: string, status: number, more: object = {}) => ({
  type: `/problems/${name}`,
  title: `Title of ${name}`,
  status,
  instance: '/requests/abc',
  ...more,
});
