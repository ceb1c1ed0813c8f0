/** The one typed door to the part-list reader: types only, so that a page can import it without the reader. */
import type { PartListChoices, PartListReading } from '#shared/domain/part-list/types.ts';

/** Exposed by part-list.worker.ts through comlink. */
export type PartListWorker = {
  /** Takes the bytes over and reads them; they stay with the worker for the next choices. */
  open(bytes: Uint8Array, choices: PartListChoices): PartListReading;
  /** Reads the open file again. Throws when none is open. */
  read(choices: PartListChoices): PartListReading;
};
