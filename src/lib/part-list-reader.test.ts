import { expose } from 'comlink';
import { readFileSync } from 'node:fs';
import { afterEach, describe, expect, it } from 'vitest';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import { createPartListReader, type PartListReader } from '#src/lib/part-list-reader.ts';
import { openPartList } from '#workers/part-list/open-part-list.ts';

const bytes = readFileSync(new URL('../../fixtures/csv/mixed-300.csv', import.meta.url));

/** A worker's two ends in one thread: what the page sends arrives as structured clones, like in a browser. */
function startChannel(answers: boolean) {
  const { port1, port2 } = new MessageChannel();
  const faults = new EventTarget();
  if (answers) expose(openPartList(), port2);
  const endOf = (type: string): Pick<EventTarget, 'addEventListener' | 'removeEventListener'> =>
    type === 'error' ? faults : port1;
  return {
    postMessage: (message: unknown, transfer: Transferable[] = []) => port1.postMessage(message, transfer),
    addEventListener: (type: string, listener: EventListenerOrEventListenerObject) =>
      endOf(type).addEventListener(type, listener),
    removeEventListener: (type: string, listener: EventListenerOrEventListenerObject) =>
      endOf(type).removeEventListener(type, listener),
    start: () => port1.start(),
    terminate: () => {
      port1.close();
      port2.close();
    },
    fail: (message: string) => faults.dispatchEvent(Object.assign(new Event('error'), { message })),
  };
}

describe('the part-list reader of a page', () => {
  let reader: PartListReader | null = null;
  let worker: ReturnType<typeof startChannel> | null = null;
  const start = (answers = true) =>
    createPartListReader(() => {
      worker = startChannel(answers);
      return worker;
    });
  afterEach(() => {
    reader?.close();
    reader = null;
  });

  it('reads a file as the server will, and again with new choices from the bytes it holds', async () => {
    reader = start();
    const file = new Blob([bytes]);
    expect(await reader.open(file)).toEqual(readPartList(bytes, {}));
    const choices = { unit: 'in', skips: [17, 46] } as const;
    expect(await reader.read(choices)).toEqual(readPartList(bytes, choices));
    expect((await file.arrayBuffer()).byteLength).toBe(bytes.length);
  });

  it('says so when no file is open', async () => {
    reader = start();
    await expect(reader.read({})).rejects.toThrow('no part list is open');
  });

  it('whoever waits hears of a closed or a failed worker', async () => {
    reader = start(false);
    const closed = reader.open(new Blob(['Mark,Qty']));
    setTimeout(() => reader?.close(), 20);
    await expect(closed).rejects.toThrow('The part list was closed.');
    await expect(reader.read({})).rejects.toThrow('The part list was closed.');

    reader = start(false);
    const failed = reader.read({});
    worker?.fail('no such script');
    await expect(failed).rejects.toThrow('The part list could not be read: no such script');
  });
});
