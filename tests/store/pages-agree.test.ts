import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { pageWords } from '@/app/(line)/streams/[slug]/page-words';
import { readStreamView } from '@/app/(line)/streams/[slug]/stream-view';
import { caseAnswer, leadSignal } from '@/lib/excursions/case-answer';
import { boardRows } from '@/lib/excursions/board-rows';
import { findExcursion, listBoardStreams, listExcursions, listMeasureAgain } from '@/lib/excursions/data';
import { caseSentence } from '@/lib/excursions/stream-state';
import { formatSignedPercent, formatWithUncertainty } from '@/lib/format';
import type { Target } from '@/lib/physics/target';
import { findStreamSettings } from '@/lib/streams/data';
import { retireStream, reviseTarget } from '@/lib/streams/mutations';
import { type FreshDatabase, freshDatabase } from '../support/fresh-database';
import {
  actor,
  hour,
  newStream,
  quietLevel,
  record,
  recordInTurn,
  settleLimits,
  wafer,
} from '../support/store-line';

const boron: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1.36e15,
  tolerancePercent: 5,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};
const usual = { from: null, to: null, around: null, gauge: null, lot: null };
const options = { timeZone: 'UTC', now: hour(5000) };

let database: FreshDatabase;

beforeAll(async () => {
  database = await freshDatabase();
});
afterAll(() => database.drop());

/** A stream as the board has it and as its own page does. */
async function both(slug: string) {
  const settings = await findStreamSettings(actor, slug);
  const row = boardRows(await listBoardStreams(actor)).find((one) => one.stream.slug === slug);
  if (settings === null || row === undefined) throw new Error(`no stream ${slug}`);
  return { row, view: await readStreamView(actor, settings, usual, options) };
}

/** The newest level against expected in the words of each. */
async function againstExpected(slug: string) {
  const { row, view } = await both(slug);
  const newest = view.rows.findLast((point) => point.level !== null);
  const { expected } = row;
  const dopant =
    expected && formatWithUncertainty(expected.dopantPercent, expected.uncertaintyDopantPercent, '%');
  return {
    board: [expected && formatSignedPercent(expected.differencePercent), dopant],
    // The stream's page adds how well the difference is known.
    page: [
      newest?.texts.difference?.replace(/ ± [\d.]+/, '') ?? null,
      newest?.texts.dopant?.replace(/^\+/, '') ?? null,
    ],
  };
}

describe('the board, the list and the pages of stream and case', () => {
  it('let the same signal speak for a case that has several', async () => {
    const { id, slug } = await newStream();
    await settleLimits(id);
    await recordInTurn([
      ...Array.from({ length: 4 }, (_, i) => wafer(id, i)),
      ...Array.from({ length: 9 }, (_, i) => wafer(id, 4 + i, i < 3 ? 10.32 : 10.12)),
    ]);
    const { row, view } = await both(slug);
    const { excursions } = await listExcursions(actor, { state: 'open', stream: slug, skip: 0, most: 9 });
    const listed = excursions.find((one) => one.id === row.stream.worst?.id);
    const found = await findExcursion(actor, listed?.id ?? '');
    expect(found?.signals.length).toBeGreaterThan(1);
    const lead = caseSentence(leadSignal(found?.signals ?? []));
    expect(lead).toMatch(/in a row above the centre line/);
    expect(row.state.words).toBe(lead);
    expect(caseSentence(listed?.signal ?? null)).toBe(lead);
    expect(caseSentence(view.standing.cases[0]?.signal ?? null)).toBe(lead);
    const { answer } = pageWords(view);
    expect(answer).toContain(`: ${lead}, since wafer`);
    expect(found && caseAnswer(found)).toBe(answer);
  });

  it('say of a wafer mean out of specification the same', async () => {
    const { id, slug } = await newStream({}, { meanUpper: 10.5 });
    await record([wafer(id, 0, 10.9)]);
    const { row, view } = await both(slug);
    expect(row.state.words).toBe('wafer mean above its specification');
    expect(pageWords(view).answer).toContain(`: ${row.state.words}, at wafer`);
  });

  it('ask for the same wafers to be measured again', async () => {
    const { id, slug } = await newStream();
    const blind = (i: number) => ({ ...wafer(id, i), readings: wafer(id, i).readings.map(() => null) });
    await recordInTurn([wafer(id, 0), blind(1), blind(2)]);
    const { row, view } = await both(slug);
    expect(row.state.words).toBe('2 wafers to measure again');
    expect(pageWords(view).answer).toBe(`${slug}: ${row.state.words}`);
  });

  it('count towards the first limits alike', async () => {
    const { id, slug } = await newStream();
    await record(Array.from({ length: 7 }, (_, i) => wafer(id, i)));
    const { row, view } = await both(slug);
    expect(row.state.words).toBe('no limits yet: 7 of 25 subgroups');
    expect(pageWords(view).answer).toBe(`${slug}: ${row.state.words}`);
  });
});

describe('the newest level against expected', () => {
  it('is the same on the board and on the stream’s page, in percent and as dopant', async () => {
    const { id, slug } = await newStream();
    await reviseTarget(actor, id, boron, { effectiveFrom: hour(-1), reason: 'first' });
    await record([wafer(id, 0), wafer(id, 1, 12.4)]);
    const { board, page } = await againstExpected(slug);
    expect(board[0]).toMatch(/^\+/);
    expect(board).toEqual(page);
  });

  it('stays what it was when the target is revised, until a wafer is measured against the new one', async () => {
    const { id, slug } = await newStream();
    await reviseTarget(actor, id, boron, { effectiveFrom: hour(-1), reason: 'first' });
    await record([wafer(id, 0)]);
    const before = await againstExpected(slug);
    await reviseTarget(
      actor,
      id,
      { ...boron, densityPerCm3: 2e15 },
      { effectiveFrom: hour(1), reason: 'new' },
    );
    expect(await againstExpected(slug)).toEqual(before);
    await record([wafer(id, 2)]);
    const after = await againstExpected(slug);
    expect(after.board).toEqual(after.page);
    expect(after.board).not.toEqual(before.board);
  });

  it('is none on either where the wafers of a subgroup differ in what is expected of them', async () => {
    const { id, slug } = await newStream({ subgroup: 'ingot', subgroupSize: 2 });
    await reviseTarget(
      actor,
      id,
      { ...boron, alongCrystal: true },
      { effectiveFrom: hour(-1), reason: 'first' },
    );
    const cut = (i: number, ingotFraction: number) => wafer(id, i, 10, { lot: 'C1', ingotFraction });
    await record([cut(0, 0.1), cut(1, 0.6)]);
    expect(await againstExpected(slug)).toEqual({ board: [null, null], page: [null, null] });
  });
});

describe('the list of wafers to measure again', () => {
  const list = async (slug: string | null, skip = 0) =>
    listMeasureAgain(actor, { stream: slug, skip, most: 3 });
  const names = async (slug: string) => (await list(slug)).wafers.map((one) => one.wafer);

  it('reaches back past the subgroups that the board shows, and is left by a later judged measurement', async () => {
    const { id, slug } = await newStream();
    const blind = { ...wafer(id, 0), readings: wafer(id, 0).readings.map(() => null) };
    await record([blind, ...Array.from({ length: 40 }, (_, i) => wafer(id, i + 1, quietLevel(i)))]);
    expect((await both(slug)).row.stream.toMeasureAgain).toEqual([]);
    expect((await list(slug)).wafers).toMatchObject([
      { wafer: 'W0000', stream: { slug }, goodSites: 0, countedSites: 9 },
    ]);
    expect((await list(null)).streams).toContainEqual({ slug, name: slug, count: 1 });

    const blindAgain = { ...blind, facts: { ...blind.facts, measuredAt: hour(60) } };
    await record([blindAgain]);
    expect(await names(slug)).toEqual(['W0000', 'W0000']);
    await record([wafer(id, 0, 10, { measuredAt: hour(61) })]);
    expect(await names(slug)).toEqual([]);
  });

  it('comes in pages, the newest first, and leaves out history and streams out of use', async () => {
    const { id, slug } = await newStream();
    const blind = (i: number) => ({ ...wafer(id, i), readings: wafer(id, i).readings.map(() => null) });
    await record([blind(9)], true);
    await record([0, 1, 2, 3].map(blind));
    expect(await names(slug)).toEqual(['W0003', 'W0002', 'W0001']);
    expect((await list(slug, 3)).wafers.map((one) => one.wafer)).toEqual(['W0000']);
    await retireStream(actor, id, true);
    expect(await names(slug)).toEqual([]);
  });
});
