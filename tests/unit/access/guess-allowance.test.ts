import { describe, expect, test } from 'vitest';
import { withinGuesses } from '@/lib/access/guess-allowance';

const body = (email: unknown) => JSON.stringify({ email, password: 'four copper kettles' });
const answered = (status: number) => async () => new Response(null, { status });

async function statuses(times: number, email: unknown, status: number): Promise<number[]> {
  const all: number[] = [];
  for (let i = 0; i < times; i += 1) all.push((await withinGuesses(body(email), answered(status))).status);
  return all;
}

describe('guessing the password of one account', () => {
  test('is let through twenty times, then answered 429 without a look at the password', async () => {
    expect(await statuses(21, 'one@plant.example', 401)).toEqual([...Array<number>(20).fill(401), 429]);
    let looked = false;
    const answer = await withinGuesses(body('One@Plant.Example'), async () => {
      looked = true;
      return new Response(null, { status: 200 });
    });
    expect([answer.status, looked]).toEqual([429, false]);
    expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(50);
  });

  test('by many at the same time is let through no more often', async () => {
    const many = await Promise.all(
      Array.from({ length: 100 }, () => withinGuesses(body('two@plant.example'), answered(401))),
    );
    expect(many.filter(({ status }) => status === 401)).toHaveLength(20);
  });

  test('does not count what was no wrong password', async () => {
    expect(new Set(await statuses(30, 'three@plant.example', 200))).toEqual(new Set([200]));
    expect(new Set(await statuses(30, 'three@plant.example', 429))).toEqual(new Set([429]));
    expect(await statuses(1, 'three@plant.example', 401)).toEqual([401]);
  });

  test('without an address is for the accounts library to refuse', async () => {
    expect(new Set(await statuses(30, 7, 400))).toEqual(new Set([400]));
    expect((await withinGuesses('{', answered(400))).status).toBe(400);
  });
});
