import type { PartListChoices } from '#shared/domain/part-list/types.ts';
import { createPartListReader, type PartListReader } from '#src/lib/part-list-reader.ts';
import type { Source, UploadEvent } from '#src/features/part-lists/hooks/upload-draft.ts';

type ReadAlong = {
  /** These choices stand now. While a reading is under way only the newest are read next. */
  ask: (choices: PartListChoices) => void;
  close: () => void;
};

const UNREADABLE = 'The file could not be read. Try again; if it stays so, choose the file anew.';

/** Reads one file again whenever its choices change, one reading at a time, and tells what came of it. */
export function readAlong(
  source: Source,
  tell: (event: UploadEvent) => void,
  createReader: () => PartListReader = createPartListReader,
): ReadAlong {
  const reader = createReader();
  let wanted: PartListChoices | null = null;
  let opened = false;
  let running = false;
  let closed = false;

  const run = async () => {
    running = true;
    try {
      while (wanted !== null) {
        const of: PartListChoices = wanted;
        wanted = null;
        const reading = await (opened ? reader.read(of) : reader.open(source.bytes, of));
        opened = true;
        if (closed) return;
        tell({ type: 'read', source, of, reading });
      }
    } catch {
      // The reader's own words are a programmer's; the person needs what to do.
      if (!closed) tell({ type: 'read-failed', source, message: UNREADABLE });
    } finally {
      running = false;
    }
  };

  return {
    ask(choices) {
      wanted = choices;
      if (!running && !closed) void run();
    },
    close() {
      closed = true;
      reader.close();
    },
  };
}
