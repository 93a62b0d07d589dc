import { isAdmin, isModerator, type Actor } from '@/lib/people/actor';

/**
 * Who may do what, in one place: handlers ask before they act and pages ask before they offer, so that no button leads
 * to a refusal. It knows plain facts only. What state a thing must be in is the room's own business (409), not who may.
 * Roles add up: a moderator is a grower too, an admin a moderator too.
 */
export type Someone = Actor | null;

export type OrchardFacts = {
  ownerId: string;
  /** Growers invited to this orchard. */
  helperIds: readonly string[];
};

export type EntryFacts = {
  status: 'draft' | 'waiting' | 'returned' | 'accepted' | 'withdrawn' | 'merged';
  ownerId: string;
  /** Helpers of the orchard it stands in; none while it names no orchard. */
  helperIds: readonly string[];
};

type Owned = { ownerId: string };

const owns = (actor: Someone, { ownerId }: Owned): boolean => actor?.id === ownerId;
const helps = (actor: Someone, { helperIds }: { helperIds: readonly string[] }): boolean =>
  actor !== null && helperIds.includes(actor.id);

/** An accepted entry is everyone's to read; a merged one leads everyone on to the entry that took it in. */
export function mayReadEntry(actor: Someone, entry: EntryFacts): boolean {
  if (entry.status === 'accepted' || entry.status === 'merged' || owns(actor, entry)) return true;
  if (entry.status === 'withdrawn') return isModerator(actor);
  return helps(actor, entry) || (entry.status !== 'draft' && isModerator(actor));
}

/** Writing, submitting, withdrawing, deleting, making a draft again. */
export function mayEditEntry(actor: Someone, entry: Owned): boolean {
  return owns(actor, entry);
}

/** Adding, replacing and removing one reading. */
export function mayAddReading(actor: Someone, entry: Omit<EntryFacts, 'status'>): boolean {
  return owns(actor, entry) || helps(actor, entry);
}

/** What changed, when, by whom; and what an owner wrote beyond what was accepted. */
export function mayReadRevisions(actor: Someone, entry: Owned): boolean {
  return owns(actor, entry) || isModerator(actor);
}

export function mayOpenBench(actor: Someone): boolean {
  return isModerator(actor);
}

/** Accepting and sending back. Nobody judges their own. */
export function mayJudge(actor: Someone, entry: Owned): boolean {
  return isModerator(actor) && !owns(actor, entry);
}

/** The orchard with its exact place, its trees and its members: for members alone, whatever one's role. */
export function mayReadOrchard(actor: Someone, orchard: OrchardFacts): boolean {
  return owns(actor, orchard) || helps(actor, orchard);
}

/** The orchard itself, its trees, its members. */
export function mayChangeOrchard(actor: Someone, orchard: Owned): boolean {
  return owns(actor, orchard);
}

/** Writing a new entry about a cut in this orchard. */
export function mayWriteEntryIn(actor: Someone, orchard: Owned): boolean {
  return owns(actor, orchard);
}

/** Orchards and entries of one's own. */
export function mayKeepRecords(actor: Someone): boolean {
  return actor !== null;
}

/** Roles, disabled accounts. */
export function mayManagePeople(actor: Someone): boolean {
  return isAdmin(actor);
}
