import { Decision, decideEntry } from '@/lib/entries/decide';
import { EntryParams } from '@/lib/entries/routes';
import { EntryView } from '@/lib/entries/schema';
import { entryViews } from '@/lib/entries/view';
import { demand, findEntry } from '@/lib/entries/visibility';
import { handler, json, route } from '@/lib/http/handler';
import { mayJudge } from '@/lib/policy/policy';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handler(
    {
      as: 'moderator',
      summary: 'Accept what waits, or send it back with a note',
      params: EntryParams,
      body: Decision,
      output: EntryView,
      find: async ({ db, actor, params }) => {
        const found = await findEntry(db, actor, params.id, { lock: true });
        demand(mayJudge(actor, found.facts), 'Nobody judges an entry of their own.');
        return found;
      },
    },
    async ({ db, actor, params, subject, body, ifMatch, audit }) => {
      await decideEntry(db, actor, subject.row, body, ifMatch);
      await audit({
        action: body.decision === 'accept' ? 'entry.accepted' : 'entry.returned',
        subject: { kind: 'entry', id: params.id },
        detail: { setAside: body.setAside },
      });
      const now = await findEntry(db, actor, params.id);
      const [view] = await entryViews(db, actor, [now]);
      return json(view, { etag: now.shown.number });
    },
  ),
});
