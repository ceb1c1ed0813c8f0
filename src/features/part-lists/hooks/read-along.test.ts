import { describe, expect, it } from 'vitest';
import type { PartListChoices, PartListReading } from '#shared/domain/part-list/types.ts';
import { readAlong } from '#src/features/part-lists/hooks/read-along.ts';
import type { Source, UploadEvent } from '#src/features/part-lists/hooks/upload-draft.ts';

const source: Source = { kind: 'file', name: 'a.csv', bytes: new Blob(['Mark']) };
const settle = () => new Promise((done) => setTimeout(done, 0));

/** A reader whose answers are given by hand, in the order they were asked for. */
function slowReader() {
  const asked: { kind: 'open' | 'read'; choices: PartListChoices; answer: () => void; fail: () => void }[] =
    [];
  const wait = (kind: 'open' | 'read', choices: PartListChoices) =>
    new Promise<PartListReading>((resolve, reject) => {
      asked.push({
        kind,
        choices,
        answer: () => resolve({ unit: choices.unit ?? 'in' } as PartListReading),
        fail: () => reject(new Error('worker ended')),
      });
    });
  let closed = false;
  return {
    asked,
    isClosed: () => closed,
    create: () => ({
      open: (_file: Blob, choices: PartListChoices = {}) => wait('open', choices),
      read: (choices: PartListChoices) => wait('read', choices),
      close: () => void (closed = true),
    }),
  };
}

describe('reading along', () => {
  it('opens the file once and reads only the newest choices next', async () => {
    const reader = slowReader();
    const told: UploadEvent[] = [];
    const along = readAlong(source, (event) => told.push(event), reader.create);
    along.ask({});
    along.ask({ unit: 'ft' });
    along.ask({ unit: 'mm' });
    expect(reader.asked.map(({ kind, choices }) => [kind, choices])).toEqual([['open', {}]]);
    reader.asked[0]?.answer();
    await settle();
    expect(reader.asked.slice(1).map(({ kind, choices }) => [kind, choices])).toEqual([
      ['read', { unit: 'mm' }],
    ]);
    reader.asked[1]?.answer();
    await settle();
    expect(told).toEqual([
      { type: 'read', source, of: {}, reading: { unit: 'in' } },
      { type: 'read', source, of: { unit: 'mm' }, reading: { unit: 'mm' } },
    ]);
    along.ask({ unit: 'm' });
    expect(reader.asked).toHaveLength(3);
  });

  it('says when the reading breaks down, and tries again when asked', async () => {
    const reader = slowReader();
    const told: UploadEvent[] = [];
    const along = readAlong(source, (event) => told.push(event), reader.create);
    along.ask({});
    reader.asked[0]?.fail();
    await settle();
    expect(told).toMatchObject([{ type: 'read-failed', source }]);
    along.ask({});
    expect(reader.asked[1]?.kind).toBe('open');
  });

  it('is silent once the file is put away', async () => {
    const reader = slowReader();
    const told: UploadEvent[] = [];
    const along = readAlong(source, (event) => told.push(event), reader.create);
    along.ask({});
    along.close();
    reader.asked[0]?.answer();
    await settle();
    expect(told).toEqual([]);
    expect(reader.isClosed()).toBe(true);
  });
});
