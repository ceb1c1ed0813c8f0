import type { Role } from '#shared/permissions.ts';

/** Who is doing it: the signed-in person as the services and presenters need to know them. */
export type Actor = { id: string; name: string; email: string; role: Role };
