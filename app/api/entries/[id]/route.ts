import { EntryParams, findToChange, findToRead } from '@/lib/entries/routes';
import { saveEntry } from '@/lib/entries/save';
import { EntryBody, EntryView } from '@/lib/entries/schema';
import { entryViews } from '@/lib/entries/view';
import { demand, findEntryIfAny } from '@/lib/entries/visibility';
import { removeEntry } from '@/lib/entries/withdraw';
import { handler, json, nothing, route } from '@/lib/http/handler';
import { mayEditEntry } from '@/lib/policy/policy';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'all',
      summary: 'One entry, as you may see it',
      params: EntryParams,
      output: EntryView,
      find: findToRead,
    },
    async ({ db, actor, subject }) => {
      const [view] = await entryViews(db, actor, [subject]);
      return json(view, { etag: subject.shown.number });
    },
  ),
  PUT: handler(
    {
      as: 'grower',
      summary: 'Create a draft, or change an entry of yours',
      params: EntryParams,
      body: EntryBody,
      output: EntryView,
      find: async ({ db, actor, params }) => {
        const found = await findEntryIfAny(db, actor, params.id, { lock: true });
        if (found) demand(mayEditEntry(actor, found.facts), 'Only whoever wrote this entry may change it.');
        return found?.row ?? null;
      },
    },
    async ({ db, actor, params, subject, body, ifMatch }) => {
      const { row, revision, created } = await saveEntry(db, actor, params.id, subject, body, ifMatch);
      const [view] = await entryViews(db, actor, [{ row, shown: revision }]);
      return json(view, { status: created ? 201 : 200, etag: revision.number });
    },
  ),
  DELETE: handler(
    {
      as: 'grower',
      summary: 'Delete a draft, withdraw anything further along',
      params: EntryParams,
      find: findToChange,
    },
    async ({ db, params, subject, ifMatch, audit }) => {
      const outcome = await removeEntry(db, subject.row, ifMatch);
      await audit({ action: `entry.${outcome}`, subject: { kind: 'entry', id: params.id } });
      return nothing;
    },
  ),
});
