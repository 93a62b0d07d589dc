import { z } from 'zod';
import { Uuid } from '@/lib/entries/schema';
import { handler, json, nothing, route } from '@/lib/http/handler';
import { findOwnOrchard } from '@/lib/orchards/find';
import { Tree, TreeBody } from '@/lib/orchards/schema';
import { removeTree, saveTree } from '@/lib/orchards/trees';

const params = z.object({ id: Uuid, treeId: Uuid });

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  PUT: handler(
    {
      as: 'grower',
      summary: 'Plant a tree in an orchard of yours, or change one',
      params,
      body: TreeBody,
      output: Tree,
      find: ({ db, actor, params }) => findOwnOrchard(db, actor, params.id),
    },
    async ({ db, params: { id, treeId }, body, ifMatch, audit }) => {
      const { tree, outcome } = await saveTree(db, id, treeId, body, ifMatch);
      if (outcome !== 'unchanged') {
        await audit({
          action: `tree.${outcome}`,
          subject: { kind: 'tree', id: treeId },
          detail: { orchard: id },
        });
      }
      return json(tree, { status: outcome === 'created' ? 201 : 200, etag: tree.revision });
    },
  ),
  DELETE: handler(
    {
      as: 'grower',
      summary: 'Take a tree out of an orchard of yours',
      params,
      find: ({ db, actor, params }) => findOwnOrchard(db, actor, params.id),
    },
    async ({ db, params: { id, treeId }, ifMatch, audit }) => {
      await removeTree(db, id, treeId, ifMatch);
      await audit({ action: 'tree.removed', subject: { kind: 'tree', id: treeId }, detail: { orchard: id } });
      return nothing;
    },
  ),
});
