import { afterEach, describe, expect, it, vi } from 'vitest';
import { request } from '#web/api/client.ts';

const answer = (status: number, body: string) =>
  vi.stubGlobal(
    'fetch',
    vi.fn(async () => new Response(status === 204 ? null : body, { status })),
  );

afterEach(() => vi.unstubAllGlobals());

describe('a request', () => {
  it('goes to the address of its route with its places encoded and its query', async () => {
    answer(200, '{"rows":[],"next":null}');
    await request('listRuns', { places: { project: 'a b' }, query: { state: 'flight', branch: '' } });
    const [address, init] = vi.mocked(fetch).mock.calls[0]!;
    expect(address).toBe('/api/projects/a%20b/runs?state=flight');
    expect(init).toMatchObject({ method: 'GET', credentials: 'same-origin' });
  });

  it('sends its body as JSON', async () => {
    answer(204, '');
    expect(await request('askReset', { body: { email: 'x@y.example' } })).toBeNull();
    const [, init] = vi.mocked(fetch).mock.calls[0]!;
    expect(init).toMatchObject({ method: 'POST', body: '{"email":"x@y.example"}' });
  });

  it('fails with the problem that the server tells', async () => {
    const problem = {
      title: 'Not found',
      status: 404,
      code: 'NOT_FOUND',
      detail: 'expected a project',
      hint: 'h',
    };
    answer(404, JSON.stringify(problem));
    await expect(request('showProject', { places: { project: 'x' } })).rejects.toMatchObject(problem);
  });

  it('says that the server is away where the network fails', async () => {
    vi.stubGlobal(
      'fetch',
      vi.fn(async () => Promise.reject(new TypeError('failed'))),
    );
    await expect(request('showSession')).rejects.toMatchObject({ code: 'SERVER_AWAY', status: 0 });
  });

  it('says that the server is away where a proxy answers for it', async () => {
    answer(502, '<html>');
    await expect(request('showSession')).rejects.toMatchObject({ code: 'SERVER_AWAY' });
  });

  it('says so where an answer is none of ours', async () => {
    answer(418, 'teapot');
    await expect(request('showSession')).rejects.toMatchObject({ code: 'SERVER_ANSWER', status: 418 });
  });

  it('leaves a cancelled request alone', async () => {
    const stop = new AbortController();
    stop.abort();
    vi.stubGlobal(
      'fetch',
      vi.fn(async () => Promise.reject(stop.signal.reason)),
    );
    await expect(request('showSession', { signal: stop.signal })).rejects.toBe(stop.signal.reason);
  });
});
