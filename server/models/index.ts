import type { Sequelize } from 'sequelize';
import { initJobs } from '#server/models/jobs.ts';
import { initPeople } from '#server/models/people.ts';
import { initPlans } from '#server/models/plans.ts';
import { initRack } from '#server/models/rack.ts';
import { initYard } from '#server/models/yard.ts';

export * from '#server/models/jobs.ts';
export * from '#server/models/people.ts';
export * from '#server/models/plans.ts';
export * from '#server/models/rack.ts';
export * from '#server/models/yard.ts';

/** Binds every model to the open database. */
export function initModels(sequelize: Sequelize): void {
  for (const init of [initPeople, initYard, initJobs, initPlans, initRack]) init(sequelize);
}
