import { isDeepStrictEqual } from 'node:util';
import type { Db } from '@/lib/database';
import { Conflict, Invalid, NotFound } from '@/lib/errors/errors';
import { allowRevision, requireAbsence, requireRevision } from '@/lib/http/condition';
import { isSpeciesSlug } from '@/lib/species/catalogue';
import type { Tree, TreeBody } from './schema';
import { lockTree } from './table';

export type SavedTree = { tree: Tree; outcome: 'created' | 'changed' | 'unchanged' };

const DUPLICATE = 1062;

/**
 * Plants a tree in an orchard, or changes one. The caller has asked whether this person may change the orchard.
 * @throws Invalid for a species that is not in the catalogue, Stale, ConditionRequired, NotFound for an id that stands in
 * another orchard
 */
export async function saveTree(
  db: Db,
  orchardId: string,
  id: string,
  body: TreeBody,
  ifMatch: number | null,
): Promise<SavedTree> {
  if (body.species !== null && !isSpeciesSlug(body.species)) {
    const message = 'is not in the catalogue; GET /api/species lists what is';
    throw new Invalid([{ path: 'species', message }]);
  }
  const existing = await treeIn(db, orchardId, id);
  if (existing) return change(db, existing, body, ifMatch);
  requireAbsence(ifMatch);
  try {
    await db('trees').insert({ id, orchard_id: orchardId, ...treeRow(body) });
  } catch (error) {
    if ((error as { errno?: number }).errno !== DUPLICATE) throw error;
    const made = await treeIn(db, orchardId, id);
    if (!made) throw error;
    return change(db, made, body, ifMatch);
  }
  return { tree: { id, revision: 1, ...body }, outcome: 'created' };
}

/**
 * Takes a tree out of an orchard. One that an entry speaks of stays, for the entry would lose what it was about.
 * @throws NotFound, Stale, Conflict
 */
export async function removeTree(
  db: Db,
  orchardId: string,
  id: string,
  ifMatch: number | null,
): Promise<void> {
  const tree = await treeIn(db, orchardId, id);
  if (!tree) throw new NotFound();
  allowRevision(ifMatch, tree.revision);
  const entry = await db('revisions').where({ tree_id: id }).first<{ id: number } | undefined>('id');
  if (entry) throw new Conflict('Entries were written about this tree, so it stays.');
  await db('trees').where({ id }).delete();
}

async function treeIn(db: Db, orchardId: string, id: string): Promise<Tree | null> {
  const found = await lockTree(db, id);
  if (!found) return null;
  const { orchardId: standsIn, ...tree } = found;
  if (standsIn !== orchardId) throw new NotFound();
  return tree;
}

async function change(db: Db, tree: Tree, body: TreeBody, ifMatch: number | null): Promise<SavedTree> {
  const { id, revision, ...content } = tree;
  if (requireRevision(ifMatch, revision, isDeepStrictEqual(content, body)) === 'unchanged') {
    return { tree, outcome: 'unchanged' };
  }
  await db('trees')
    .where({ id })
    .update({ ...treeRow(body), revision: revision + 1, updated_at: new Date() });
  return { tree: { id, revision: revision + 1, ...body }, outcome: 'changed' };
}

function treeRow({ yearPlanted, ...body }: TreeBody) {
  return { ...body, year_planted: yearPlanted };
}
