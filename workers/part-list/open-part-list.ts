import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import type { PartListWorker } from '#workers/part-list/api.ts';

/** Holds the bytes of one file, so that new choices do not send them again. */
export function openPartList(): PartListWorker {
  let held: Uint8Array | null = null;
  return {
    open(bytes, choices) {
      held = bytes;
      return readPartList(bytes, choices);
    },
    read(choices) {
      if (!held) throw new Error('no part list is open');
      return readPartList(held, choices);
    },
  };
}
