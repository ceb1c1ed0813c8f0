import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { ApiError } from '#src/lib/api-error.ts';
import { api } from '#src/lib/api.ts';

const Tag = z.object({ tag: z.int() });

function answering(status: number, body: unknown, headers: Record<string, string> = {}) {
  const answer = vi.fn<typeof fetch>(() =>
    Promise.resolve(
      new Response(typeof body === 'string' ? body : JSON.stringify(body), { status, headers }),
    ),
  );
  vi.stubGlobal('fetch', answer);
  return answer;
}

async function failureOf(request: Promise<unknown>): Promise<ApiError> {
  const caught: unknown = await request.then(
    () => null,
    (error: unknown) => error,
  );
  if (caught instanceof ApiError) return caught;
  throw new Error(`no ApiError but ${String(caught)}`);
}

afterEach(() => vi.unstubAllGlobals());

describe('api', () => {
  it('sends JSON below /api and answers what the schema makes of it', async () => {
    const fetched = answering(200, { tag: 414, extra: 'left out' });
    await expect(api.post('/drops', { slot: 'B-3-2' }, Tag)).resolves.toEqual({ tag: 414 });
    const [url, init] = fetched.mock.calls[0] ?? [];
    expect(url).toBe('/api/drops');
    expect(init).toMatchObject({ method: 'POST', body: '{"slot":"B-3-2"}', credentials: 'same-origin' });
    expect(new Headers(init?.headers).get('content-type')).toBe('application/json');
  });

  it('leaves the content type of an upload to the browser, which knows the boundary', async () => {
    const fetched = answering(200, { tag: 1 });
    const form = new FormData();
    form.set('details', '{}');
    await api.upload('/jobs/1/part-lists', form, Tag);
    const [, init] = fetched.mock.calls[0] ?? [];
    expect(init?.body).toBe(form);
    expect(new Headers(init?.headers).has('content-type')).toBe(false);
  });

  it('carries code, words, request id, status and every issue of a refusal', async () => {
    answering(422, {
      error: {
        code: 'bad-input',
        message: 'Two fields are wrong.',
        requestId: 'r-17',
        issues: [
          { path: 'slot', message: 'Fill this in.' },
          { row: 12, path: 'length', message: 'not a length' },
        ],
      },
    });
    const failure = await failureOf(api.put('/offers/1', {}, Tag));
    expect(failure).toMatchObject({
      code: 'bad-input',
      message: 'Two fields are wrong.',
      requestId: 'r-17',
      status: 422,
    });
    expect(failure.issues).toEqual([
      { path: 'slot', message: 'Fill this in.' },
      { row: 12, path: 'length', message: 'not a length' },
    ]);
  });

  it.each([
    [401, 'not-signed-in'],
    [403, 'not-allowed'],
    [404, 'not-found'],
    [413, 'file-too-large'],
    [429, 'too-many-tries'],
    [502, 'server-fault'],
  ])('reads status %i as %s when the answer is not in the agreed shape', async (status, code) => {
    answering(status, '<html>gateway</html>', { 'x-request-id': 'r-9' });
    const failure = await failureOf(api.get('/drops', Tag));
    expect(failure).toMatchObject({ code, status, requestId: 'r-9' });
    expect(failure.message).not.toContain('<html>');
  });

  it('keeps the words of a refused sign-in', async () => {
    answering(403, { code: 'FORBIDDEN', message: 'This person no longer has access. Ask a manager.' });
    expect((await failureOf(api.post('/auth/sign-in/email', {}, z.unknown()))).message).toBe(
      'This person no longer has access. Ask a manager.',
    );
  });

  it('says that the server does not answer when there is no connection', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('network')));
    expect(await failureOf(api.get('/drops', Tag))).toMatchObject({ code: 'unreachable', status: 0 });
  });

  it('passes an abort on as an abort, not as a fault', async () => {
    const leaving = new AbortController();
    vi.stubGlobal('fetch', () => Promise.reject(new DOMException('left the page', 'AbortError')));
    leaving.abort();
    await expect(api.get('/drops', Tag, { signal: leaving.signal })).rejects.toMatchObject({
      name: 'AbortError',
    });
  });

  it('refuses a good answer of the wrong shape instead of drawing nonsense', async () => {
    answering(200, { tag: 'D-0414' });
    expect(await failureOf(api.get('/drops/1', Tag))).toMatchObject({ code: 'bad-answer', status: 200 });
  });
});
