/** What people do to the rack by hand: log, move, correct, scrap. Every change is one event in the drop's history. */
import { write } from '#server/database.ts';
import { ShopError } from '#server/errors.ts';
import { DropRow } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';
import { expectFound, expectVersion } from '#server/policies/version.ts';
import { record } from '#server/services/audit.ts';
import { tellDrop } from '#server/services/drop-events.ts';
import { findSectionTyped, gradeTyped } from '#server/services/sections.ts';
import { tagText, takeNumbers } from '#server/services/tags.ts';
import { pieceMassMg } from '#shared/domain/mass.ts';
import { PLATE_FAMILIES } from '#shared/domain/section/types.ts';
import type { ErrorIssue } from '#shared/errors.ts';
import type { DropPatch, DropState, LogDropInput } from '#shared/schemas/rack.ts';

/** Logs a drop by hand; it gets the next tag, which is never used again. Returns its id. */
export function logDrop(input: LogDropInput, actor: Actor): Promise<number> {
  return write(async () => {
    const typed = findSectionTyped(input.section, { plate: true });
    if (!typed.ok) throw new ShopError('bad-input', 'The section is not clear.', [typed.issue]);
    const { section } = typed;
    const isPlate = PLATE_FAMILIES.includes(section.family);
    if (isPlate && input.widthNm === null)
      throw new ShopError('bad-input', 'A plate drop needs its width.', [
        { path: 'widthNm', message: `${section.name} is plate: type the width` },
      ]);
    const [tag = 0] = await takeNumbers('tag', 1);
    const drop = await DropRow.create({
      tag,
      section: isPlate ? section.stockKey : section.name,
      stockKey: section.stockKey,
      family: section.family,
      grade: gradeTyped(input.grade),
      lengthNm: input.lengthNm,
      widthNm: isPlate ? input.widthNm : null,
      massMg: pieceMassMg(section, input.lengthNm, input.widthNm ?? undefined),
      slot: input.slot,
      heat: input.heat,
      note: input.note,
      state: 'racked',
      loggedById: actor.id,
      loggedAt: new Date().toISOString(),
    });
    await tellDrop(drop, actor, `logged by hand, racked in ${input.slot}`, input.note);
    await record(actor, 'drop:log', tagText(tag), {
      section: drop.section,
      grade: drop.grade,
      lengthNm: drop.lengthNm,
      slot: drop.slot,
      heat: input.heat,
    });
    return drop.id;
  });
}

/** From which states a person may put a drop into another by hand; held and cut ones move with their plan. */
const MOVES: Readonly<Record<'racked' | 'scrapped' | 'missing', readonly DropState[]>> = {
  racked: ['missing', 'scrapped'],
  scrapped: ['racked', 'missing'],
  missing: ['racked'],
};

function expectMove(drop: DropRow, patch: DropPatch): void {
  const name = tagText(drop.tag);
  if (drop.state === 'cut')
    throw new ShopError('wrong-state', `${name} is cut up. What was made of it has tags of its own.`);
  if (patch.state === undefined || patch.state === drop.state || MOVES[patch.state].includes(drop.state))
    return;
  throw new ShopError(
    'wrong-state',
    drop.state === 'held'
      ? `${name} is held for a plan. Have the plan withdrawn first.`
      : `${name} is ${drop.state} and cannot become ${patch.state}.`,
  );
}

/** What the patch changes, in words for the history; nothing when it changes nothing. */
function changesOf(drop: DropRow, patch: DropPatch) {
  const heat = drop.heat ?? null;
  return {
    state: patch.state !== undefined && patch.state !== drop.state ? patch.state : null,
    slot:
      patch.slot !== undefined && patch.slot !== drop.slot
        ? `moved from ${drop.slot} to ${patch.slot}`
        : null,
    heat:
      patch.heat !== undefined && patch.heat !== heat
        ? `heat ${heat ?? 'unknown'} → ${patch.heat ?? 'unknown'}`
        : null,
    note: patch.note !== undefined && patch.note !== drop.note ? 'note changed' : null,
  };
}

const STATE_WORDS = { racked: 'back on the rack', scrapped: 'scrapped', missing: 'not found' } as const;

export function changeDrop(dropId: number, patch: DropPatch, actor: Actor): Promise<void> {
  return write(async () => {
    const drop = expectFound(await DropRow.findByPk(dropId), 'drop');
    const name = tagText(drop.tag);
    expectVersion(drop, patch.version, name);
    expectMove(drop, patch);
    const { state, slot, heat, note } = changesOf(drop, patch);
    const issues: ErrorIssue[] = [];
    if (heat !== null && patch.reason === '')
      issues.push({ path: 'reason', message: 'a heat needs a reason: say where it was read' });
    if (drop.state === 'scrapped' && state === 'racked' && patch.reason === '')
      issues.push({ path: 'reason', message: 'it was scrapped: say why it is back' });
    if (issues.length > 0)
      throw new ShopError('bad-input', `Nothing was changed on ${name}: a reason is missing.`, issues);
    const said = [state === null ? null : STATE_WORDS[state], slot, heat, note].filter(
      (part) => part !== null,
    );
    if (said.length === 0) return;
    await drop.update({
      state: patch.state ?? drop.state,
      slot: patch.slot ?? drop.slot,
      heat: patch.heat === undefined ? (drop.heat ?? null) : patch.heat,
      note: patch.note ?? drop.note,
      version: drop.version + 1,
    });
    await tellDrop(drop, actor, said.join(', '), patch.reason);
    await record(actor, 'drop:edit', name, { changed: said, reason: patch.reason });
  });
}
