/** Who may do what: one typed table. The server enforces it; answers carry `can` so that a page never re-derives it. */
export const ROLES = ['detailer', 'purchaser', 'operator', 'yard', 'manager'] as const;
export type Role = (typeof ROLES)[number];

const everyone = ROLES;

export const PERMISSIONS = {
  'shop:read': everyone,
  'shop:edit': ['manager'],
  'person:read': ['manager'],
  'person:edit': ['manager'],
  'mail:read': ['manager'],
  'audit:read': ['manager'],
  'station:read': everyone,
  'station:edit': ['manager'],
  'drop-rule:read': everyone,
  'drop-rule:edit': ['manager'],
  'job:read': everyone,
  'job:edit': ['detailer', 'manager'],
  'part-list:read': everyone,
  'part-list:edit': ['detailer', 'manager'],
  'supplier:read': everyone,
  'supplier:edit': ['purchaser', 'manager'],
  'offer:read': everyone,
  'offer:edit': ['purchaser', 'manager'],
  'plan:read': everyone,
  'plan:draft': ['detailer', 'purchaser', 'manager'],
  'plan:issue': ['purchaser', 'manager'],
  'plan:withdraw': ['purchaser', 'manager'],
  'bar:cut': ['operator', 'manager'],
  'drop:read': everyone,
  'drop:log': ['operator', 'yard', 'manager'],
  'drop:edit': ['yard', 'manager'],
} as const satisfies Record<string, readonly Role[]>;

export type Action = keyof typeof PERMISSIONS;
export const ACTIONS = Object.keys(PERMISSIONS) as Action[];

/** True when a person of this role may do this at all; state and ownership are the policies' business. */
export function roleMay(role: Role, action: Action): boolean {
  return (PERMISSIONS[action] as readonly Role[]).includes(role);
}

/** Every action with yes or no for one role, as sent with the session. */
export function canOf(role: Role): Record<Action, boolean> {
  return Object.fromEntries(ACTIONS.map((action) => [action, roleMay(role, action)])) as Record<
    Action,
    boolean
  >;
}
