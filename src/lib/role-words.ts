import type { Role } from '#shared/permissions.ts';

export const ROLE_WORDS: Readonly<Record<Role, string>> = {
  detailer: 'Detailer',
  purchaser: 'Purchaser',
  operator: 'Operator',
  yard: 'Yard hand',
  manager: 'Manager',
};

/** What each role comes for, said where somebody is invited. */
export const ROLE_DUTIES: Readonly<Record<Role, string>> = {
  detailer: 'part lists and draft plans',
  purchaser: 'plans, suppliers and offers',
  operator: 'cutting issued plans, logging drops',
  yard: 'the drop rack',
  manager: 'everything, people and settings too',
};
