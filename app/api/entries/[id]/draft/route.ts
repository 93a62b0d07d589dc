import { EntryParams, findToChange } from '@/lib/entries/routes';
import { EntryView } from '@/lib/entries/schema';
import { entryViews } from '@/lib/entries/view';
import { findEntry } from '@/lib/entries/visibility';
import { redraftEntry } from '@/lib/entries/withdraw';
import { allowRevision } from '@/lib/http/condition';
import { handler, json, route } from '@/lib/http/handler';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handler(
    {
      as: 'grower',
      summary: 'Make a withdrawn entry a draft again',
      params: EntryParams,
      output: EntryView,
      find: findToChange,
    },
    async ({ db, actor, params, subject, ifMatch, audit }) => {
      allowRevision(ifMatch, subject.row.revision);
      await redraftEntry(db, subject.row);
      await audit({ action: 'entry.redrafted', subject: { kind: 'entry', id: params.id } });
      const now = await findEntry(db, actor, params.id);
      const [view] = await entryViews(db, actor, [now]);
      return json(view, { etag: now.shown.number });
    },
  ),
});
