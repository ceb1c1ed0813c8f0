import type { Sequelize } from 'sequelize';
import { initPeople } from '#server/models/people.ts';

export * from '#server/models/people.ts';

/** Binds every model to the open database. */
export function initModels(sequelize: Sequelize): void {
  initPeople(sequelize);
}
