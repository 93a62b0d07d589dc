import { describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/people/actor';
import * as policy from '@/lib/policy/policy';

const person = (id: string, role: Actor['role'] = 'grower'): Actor => ({
  id,
  role,
  name: id,
  units: 'metric',
});

/** Every kind of person that the product knows, as seen from one orchard and the entries in it. */
const people = {
  visitor: null,
  owner: person('owner'),
  'other grower': person('other'),
  helper: person('helper'),
  moderator: person('moderator', 'moderator'),
  admin: person('admin', 'admin'),
  'moderator who owns it': person('owner', 'moderator'),
  'admin who owns it': person('owner', 'admin'),
  'moderator who helps there': person('helper', 'moderator'),
};
type Kind = keyof typeof people;
const kinds = Object.keys(people) as Kind[];

const everyone = kinds;
const owners: Kind[] = ['owner', 'moderator who owns it', 'admin who owns it'];
const helpers: Kind[] = ['helper', 'moderator who helps there'];
const bench: Kind[] = [
  'moderator',
  'admin',
  'moderator who owns it',
  'admin who owns it',
  'moderator who helps there',
];
const members = [...owners, ...helpers];
const signedIn = kinds.filter((kind) => kind !== 'visitor');

const orchard = { ownerId: 'owner', helperIds: ['helper'] };
const entry = (status: policy.EntryFacts['status']): policy.EntryFacts => ({ status, ...orchard });

const rules: [string, (actor: policy.Someone) => boolean, Kind[]][] = [
  ['read an accepted entry', (actor) => policy.mayReadEntry(actor, entry('accepted')), everyone],
  ['be led on from a merged entry', (actor) => policy.mayReadEntry(actor, entry('merged')), everyone],
  ['read a draft', (actor) => policy.mayReadEntry(actor, entry('draft')), members],
  ['read a waiting entry', (actor) => policy.mayReadEntry(actor, entry('waiting')), [...members, ...bench]],
  ['read a returned entry', (actor) => policy.mayReadEntry(actor, entry('returned')), [...members, ...bench]],
  [
    'read a withdrawn entry',
    (actor) => policy.mayReadEntry(actor, entry('withdrawn')),
    [...owners, ...bench],
  ],
  ['change an entry', (actor) => policy.mayEditEntry(actor, entry('draft')), owners],
  ['add a reading', (actor) => policy.mayAddReading(actor, entry('accepted')), members],
  ['read revisions', (actor) => policy.mayReadRevisions(actor, entry('accepted')), [...owners, ...bench]],
  ['open the bench', policy.mayOpenBench, bench],
  [
    'judge an entry',
    (actor) => policy.mayJudge(actor, entry('waiting')),
    ['moderator', 'admin', 'moderator who helps there'],
  ],
  ['read an orchard with its exact place', (actor) => policy.mayReadOrchard(actor, orchard), members],
  ['change an orchard', (actor) => policy.mayChangeOrchard(actor, orchard), owners],
  ['write an entry in an orchard', (actor) => policy.mayWriteEntryIn(actor, orchard), owners],
  ['keep records of their own', policy.mayKeepRecords, signedIn],
  ['manage people', policy.mayManagePeople, ['admin', 'admin who owns it']],
];

describe.each(rules)('to %s', (_what, may, allowed) => {
  it.each(kinds)('%s', (kind) => {
    expect(may(people[kind])).toBe(allowed.includes(kind));
  });
});

it('an entry that names no orchard has no helpers', () => {
  const lone: policy.EntryFacts = { status: 'draft', ownerId: 'owner', helperIds: [] };
  expect(policy.mayReadEntry(people.helper, lone)).toBe(false);
  expect(policy.mayAddReading(people.helper, lone)).toBe(false);
  expect(policy.mayReadEntry(people.owner, lone)).toBe(true);
});
