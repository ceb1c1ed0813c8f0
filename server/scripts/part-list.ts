/** `part-list FILE [--unit in|mm|ft|m|cm]`: a part list read to JSON on stdout; words on stderr, exit 2, when it cannot be. */
import { readFileSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import type { PartListReading } from '#shared/domain/part-list/types.ts';
import { LENGTH_UNITS, type LengthUnit } from '#shared/domain/units.ts';

const USAGE = 'Use: part-list FILE.csv [--unit in|mm|ft|m|cm]';

type Command = { file: string; unit: LengthUnit | undefined };

/** What is said to the person at the terminal, without a stack. */
type Refusal = { refusal: string };

function isNodeError(error: unknown): error is NodeJS.ErrnoException {
  return error instanceof Error && 'code' in error;
}

function readCommand(args: readonly string[]): Command | Refusal {
  try {
    const { values, positionals } = parseArgs({
      args: [...args],
      options: { unit: { type: 'string' } },
      allowPositionals: true,
    });
    const [file, ...more] = positionals;
    if (file === undefined) return { refusal: `No file is given. ${USAGE}` };
    if (more.length > 0) return { refusal: `One file at a time; also given: ${more.join(' ')}. ${USAGE}` };
    const unit = LENGTH_UNITS.find((known) => known === values.unit);
    if (values.unit !== undefined && !unit) return { refusal: `Unit ${values.unit} is not known. ${USAGE}` };
    return { file, unit };
  } catch (error) {
    if (isNodeError(error) && error.code?.startsWith('ERR_PARSE_ARGS'))
      return { refusal: `${error.message}. ${USAGE}` };
    throw error;
  }
}

function readBytes(file: string): Uint8Array | Refusal {
  try {
    return readFileSync(file);
  } catch (error) {
    if (!isNodeError(error)) throw error;
    if (error.code === 'ENOENT') return { refusal: `There is no file ${file}.` };
    if (error.code === 'EISDIR') return { refusal: `${file} is a folder, not a file.` };
    return { refusal: `${file} cannot be opened: ${error.message}.` };
  }
}

function refuse({ refusal }: Refusal): void {
  console.error(refusal);
  process.exitCode = 2;
}

function answerOf({ lines, problems, mapping, unit }: PartListReading): string {
  return `${JSON.stringify({ lines, problems, mapping, unit }, null, 2)}\n`;
}

function run(args: readonly string[]): void {
  const command = readCommand(args);
  if ('refusal' in command) return refuse(command);
  const bytes = readBytes(command.file);
  if ('refusal' in bytes) return refuse(bytes);
  const reading = readPartList(bytes, command.unit ? { unit: command.unit } : {});
  if (reading.fatal) return refuse({ refusal: `${command.file}: ${reading.fatal.message}` });
  process.stdout.write(answerOf(reading));
  if (reading.lines.length === 0) {
    refuse({
      refusal: `${command.file}: no row could be read; ${reading.problems.length} problems are listed.`,
    });
  }
}

// `part-list list.csv | head` closes the pipe before the end; that is no fault.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error;
});
run(process.argv.slice(2));
