export const ROLES = ['grower', 'moderator', 'admin'] as const;
export type Role = (typeof ROLES)[number];

/** Whoever is asking, as far as the rules need to know. */
export type Actor = { id: string; role: Role; name: string; units: 'metric' | 'imperial' };

/** Roles add up: a moderator is a grower too, an admin a moderator too. */
export function ranks(role: Role): number {
  return ROLES.indexOf(role);
}

export const isModerator = (actor: Actor | null): boolean =>
  actor !== null && ranks(actor.role) >= ranks('moderator');
export const isAdmin = (actor: Actor | null): boolean => actor?.role === 'admin';
