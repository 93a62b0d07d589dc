import { z } from 'zod';
import { Uuid } from '@/lib/entries/schema';
import { handler, json, nothing, route } from '@/lib/http/handler';
import { findOrchard, findOwnOrchard, findOwnOrchardIfAny } from '@/lib/orchards/find';
import { removeOrchard } from '@/lib/orchards/remove';
import { saveOrchard } from '@/lib/orchards/save';
import { OrchardBody, OrchardWithTrees } from '@/lib/orchards/schema';
import { orchardView, treesOf } from '@/lib/orchards/table';

const params = z.object({ id: Uuid });

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'grower',
      summary: 'An orchard with its exact place and its trees, for its members',
      params,
      output: OrchardWithTrees,
      find: ({ db, actor, params }) => findOrchard(db, actor, params.id),
    },
    async ({ db, actor, subject }) =>
      json(
        { ...orchardView(actor, subject), trees: await treesOf(db, subject.id) },
        { etag: subject.revision },
      ),
  ),
  PUT: handler(
    {
      as: 'grower',
      summary: 'Make an orchard, or change one of yours',
      params,
      body: OrchardBody,
      output: OrchardWithTrees,
      find: ({ db, actor, params }) => findOwnOrchardIfAny(db, actor, params.id),
    },
    async ({ db, actor, params: { id }, subject, body, ifMatch, audit }) => {
      const { orchard, outcome } = await saveOrchard(db, actor, id, subject, body, ifMatch);
      if (outcome !== 'unchanged') {
        await audit({ action: `orchard.${outcome}`, subject: { kind: 'orchard', id } });
      }
      const status = outcome === 'created' ? 201 : 200;
      const trees = await treesOf(db, id);
      return json({ ...orchardView(actor, orchard), trees }, { status, etag: orchard.revision });
    },
  ),
  DELETE: handler(
    {
      as: 'grower',
      summary: 'Remove an orchard that no entry names',
      params,
      find: ({ db, actor, params }) => findOwnOrchard(db, actor, params.id),
    },
    async ({ db, params: { id }, subject, ifMatch, audit }) => {
      await removeOrchard(db, subject, ifMatch);
      await audit({ action: 'orchard.removed', subject: { kind: 'orchard', id } });
      return nothing;
    },
  ),
});
