import { transfer, wrap, type Endpoint } from 'comlink';
import type { PartListChoices, PartListReading } from '#shared/domain/part-list/types.ts';
import type { PartListWorker } from '#workers/part-list/api.ts';

/** Reads one file off the page's thread; twenty thousand rows do not freeze it. */
export type PartListReader = {
  /** Hands a file over and reads it. The file itself stays usable for the upload. */
  open(file: Blob, choices?: PartListChoices): Promise<PartListReading>;
  /** Reads the open file again with new choices; the bytes are not sent again. */
  read(choices: PartListChoices): Promise<PartListReading>;
  /** Ends the worker; a reading still under way rejects. */
  close(): void;
};

/** As much of a Worker as the reader uses. */
type ReaderWorker = Endpoint & { terminate(): void };

function startWorker(): ReaderWorker {
  return new Worker(new URL('../../workers/part-list/part-list.worker.ts', import.meta.url), {
    type: 'module',
  });
}

/** One worker for one file being looked at. Readings come back in the order they were asked for. */
export function createPartListReader(start: () => ReaderWorker = startWorker): PartListReader {
  const worker = start();
  const reader = wrap<PartListWorker>(worker);
  // A worker that fails to load or is ended never answers: whoever waits must hear of it.
  const waiting = new Set<(fault: Error) => void>();
  let fault: Error | null = null;
  const stop = (error: Error) => {
    fault ??= error;
    for (const reject of waiting) reject(fault);
    waiting.clear();
  };
  worker.addEventListener('error', (event) => {
    const cause = 'message' in event && typeof event.message === 'string' ? event.message : '';
    stop(new Error(`The part list could not be read: ${cause || 'the reader did not start'}`));
  });
  const answer = <T>(ask: () => Promise<T>): Promise<T> =>
    new Promise<T>((resolve, reject) => {
      if (fault) {
        reject(fault);
        return;
      }
      waiting.add(reject);
      ask()
        .then(resolve, reject)
        .finally(() => waiting.delete(reject));
    });
  return {
    async open(file, choices = {}) {
      const buffer = await file.arrayBuffer();
      return answer(() => reader.open(transfer(new Uint8Array(buffer), [buffer]), choices));
    },
    read: (choices) => answer(() => reader.read(choices)),
    close() {
      worker.terminate();
      stop(new Error('The part list was closed.'));
    },
  };
}
