import { DropEventRow, type DropRow } from '#server/models/index.ts';
import type { Actor } from '#server/policies/actor.ts';

/** One line of a drop's history, inside the running write. */
export async function tellDrop(
  drop: DropRow,
  actor: Pick<Actor, 'name'>,
  what: string,
  why = '',
): Promise<void> {
  await DropEventRow.create({ dropId: drop.id, at: new Date().toISOString(), who: actor.name, what, why });
}
