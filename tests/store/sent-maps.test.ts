import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { POST } from '@/app/api/maps/route';
import { GET as GET_STREAMS } from '@/app/api/streams/route';
import { commandActor } from '@/lib/access/local-actor';
import { makeToken } from '@/lib/access/tokens';
import { intake } from '@/lib/command/verbs/intake';
import { getPool } from '@/lib/database/client';
import { takeSentFile } from '@/lib/maps/take-sent-file';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { fileText, newStream, wafer } from '../support/store-line';

const ADDRESS = 'http://127.0.0.1:3999/api/maps';

let database: FreshDatabase;
let data = '';
let own: { id: string; slug: string };
let other: { id: string; slug: string };
const tokens = { all: '', own: '', reading: '' };

async function token(scope: 'read' | 'intake', streamIds: string[] | null = null): Promise<string> {
  const made = await makeToken(commandActor(), { name: `${scope} token`, scope, streamIds, days: 30 });
  if (!made.ok) throw new Error(made.reason);
  return made.value;
}

beforeAll(async () => {
  database = await freshDatabase();
  data = await mkdtemp(join(tmpdir(), 'sent-maps-'));
  vi.stubEnv('EVENOHM_DATA', data);
  [own, other] = [await newStream(), await newStream()];
  tokens.all = await token('intake');
  tokens.own = await token('intake', [own.id]);
  tokens.reading = await token('read');
});
afterAll(async () => {
  vi.unstubAllEnvs();
  await database.drop();
  await rm(data, { recursive: true });
});

async function send(text: string, bearer: string, query = '', headers: Record<string, string> = {}) {
  const sent = { authorization: `Bearer ${bearer}`, 'x-file-name': 'monday.csv', ...headers };
  const answer = await POST(new Request(ADDRESS + query, { method: 'POST', body: text, headers: sent }));
  return {
    status: answer.status,
    body: (await answer.json()) as Record<string, unknown>,
    headers: answer.headers,
  };
}

const left = () => readdir(join(data, 'waiting'));

describe('a file that is sent over the network', () => {
  it('is recorded as the command records it, and answered as the command prints it', async () => {
    const text = fileText(own.slug, [wafer(own.id, 0), wafer(own.id, 1)]);
    const nothing = { refused: 0, refusals: [], notices: [] };
    expect(await send(text, tokens.own)).toMatchObject({
      status: 200,
      body: { recorded: 2, repeated: 0, ...nothing },
    });
    expect((await send(text, tokens.own)).body).toEqual({ recorded: 0, repeated: 2, ...nothing });
    const { rows } = await getPool().query(
      'SELECT source, origin, actor, recorded FROM intake_batch ORDER BY id LIMIT 1',
    );
    expect(rows).toEqual([
      { source: 'monday.csv', origin: 'network', actor: 'intake token (token)', recorded: 2 },
    ]);
    expect(await left()).toEqual([]);
  });

  it('takes from the address what it does not say itself, only checks where that is asked for', async () => {
    const bare = fileText(own.slug, [wafer(own.id, 2)]).replace(/^([^,\n]*,){5}/gm, '');
    const says = `stream=${own.slug}&wafer=X&measured-at=2021-05-01T00:00:00%2B02:00&history`;
    expect(await send(bare, tokens.own, `?${says}&check`)).toMatchObject({
      status: 200,
      body: { recorded: 0, notices: ['1 measurement could be recorded'] },
    });
    expect((await send(bare, tokens.own, `?${says}`)).body).toMatchObject({ recorded: 1 });
    const misspelt = await send(bare, tokens.own, `?${says.replace('history', 'histroy')}`);
    expect(misspelt).toMatchObject({ status: 422, body: { detail: expect.stringContaining('histroy') } });
  });

  it('is refused, with the line, for a stream that the token is not for', async () => {
    const text =
      fileText(own.slug, [wafer(own.id, 3)]) +
      fileText(other.slug, [wafer(other.id, 0)]).replace(/^.*\n/, '');
    const { status, body } = await send(text, tokens.own, '?sound');
    expect(status).toBe(422);
    expect(body).toMatchObject({
      recorded: 1,
      refused: 1,
      refusals: [
        {
          file: 'monday.csv',
          line: 11,
          column: 'stream',
          reason: `you may not record wafers of the stream "${other.slug}"`,
        },
      ],
    });
    expect((await send(text, tokens.all)).body).toMatchObject({ recorded: 1, repeated: 1 });
  });

  it('is taken by no other token, by nobody, and not with a session from a page elsewhere', async () => {
    const text = fileText(own.slug, [wafer(own.id, 4)]);
    expect((await send(text, tokens.reading)).status).toBe(403);
    const strange = await send(text, `ev_${'A'.repeat(43)}`);
    expect(strange.status).toBe(401);
    expect(strange.headers.get('www-authenticate')).toContain('Bearer');
    expect((await POST(new Request(ADDRESS, { method: 'POST', body: text }))).status).toBe(401);
    expect(await left()).toEqual([]);
  });

  it('may not be larger than is allowed, whatever its header says, and leaves nothing behind', async () => {
    const text = fileText(own.slug, [wafer(own.id, 5)]);
    const file = { name: 'large.csv', body: new Blob([text]).stream(), mostBytes: text.length - 1 };
    const options = { checkOnly: false, sound: false, history: false, defaults: {} };
    expect(await takeSentFile(commandActor(), file, options)).toMatchObject({
      ok: false,
      reason: expect.stringContaining('larger than'),
    });
    expect(await left()).toEqual([]);
    const told = await send(text, tokens.own, '', { 'content-length': '1000000001' });
    expect(told).toMatchObject({ status: 422, body: { detail: expect.stringContaining('1000 MB') } });
  });

  it('never becomes a path by its name', async () => {
    const name = encodeURIComponent('../../../etc/cron.d/evil.csv');
    const text = fileText(own.slug, [wafer(own.id, 6)]);
    expect((await send(text, tokens.own, '', { 'x-file-name': name })).status).toBe(200);
    const { rows } = await getPool().query('SELECT source FROM intake_batch ORDER BY id DESC LIMIT 1');
    expect(rows).toEqual([{ source: 'evil.csv' }]);
    expect(await readdir(data)).not.toContain('etc');
  });

  it('is put off with 429 and the time to wait when too many come at once', async () => {
    const bearer = await token('intake');
    const answers = await Promise.all(Array.from({ length: 260 }, () => send('', bearer, '?what')));
    const put = answers.filter(({ status }) => status === 429);
    expect(put.length).toBeGreaterThan(0);
    expect(put.length).toBeLessThanOrEqual(60);
    expect(Number(put[0]?.headers.get('retry-after'))).toBeGreaterThanOrEqual(1);
    expect((await send('', tokens.own, '?what')).status).toBe(422);
  });
});

describe('intake --server', () => {
  let server: Server;
  beforeAll(async () => {
    server = createServer((request, response) => {
      const body = Readable.toWeb(request) as ReadableStream<Uint8Array>;
      const headers = Object.entries(request.headers).map(
        ([name, value]) => [name, String(value)] as [string, string],
      );
      const init = { method: 'POST', headers, body, duplex: 'half' };
      void POST(new Request(new URL(request.url ?? '', ADDRESS), init)).then(async (answer) => {
        response.writeHead(answer.status, Object.fromEntries(answer.headers)).end(await answer.text());
      });
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  });
  afterAll(() => new Promise((resolve) => server.close(resolve)));

  it('records there with a token and prints the same', async () => {
    vi.stubEnv('EVENOHM_TOKEN', tokens.own);
    const file = join(data, 'tuesday.csv');
    await writeFile(
      file,
      fileText(own.slug, [wafer(own.id, 10)]) +
        fileText(other.slug, [wafer(other.id, 10)]).replace(/^.*\n/, ''),
    );
    const address = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
    const out: string[] = [];
    const said: string[] = [];
    const exit = await intake.run([file, '--sound', '--server', address], {
      out: (text) => out.push(text),
      say: (text) => said.push(text),
    });
    expect({ exit, out }).toEqual({ exit: 3, out: ['1 recorded, 0 repeated, 1 refused.'] });
    expect(said.join('\n')).toContain(
      'tuesday.csv, line 11, column stream: W0010: you may not record wafers',
    );
  });
});

describe('the list of streams', () => {
  it('is for tokens that read', async () => {
    const ask = (bearer: string) =>
      GET_STREAMS(new Request(ADDRESS, { headers: { authorization: `Bearer ${bearer}` } }));
    const { streams } = (await (await ask(tokens.reading)).json()) as {
      streams: { stream: string; sites: unknown }[];
    };
    expect(streams.map(({ stream }) => stream).sort()).toEqual([own.slug, other.slug].sort());
    expect(streams[0]?.sites).toHaveLength(9);
    expect((await ask(tokens.own)).status).toBe(403);
  });
});
