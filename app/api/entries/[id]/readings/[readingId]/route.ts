import { deleteReading, saveReading } from '@/lib/entries/readings';
import { findToCount, ReadingParams } from '@/lib/entries/routes';
import { EntryView, ReadingBody } from '@/lib/entries/schema';
import { readingView } from '@/lib/entries/view';
import { Invalid } from '@/lib/errors/errors';
import { handler, json, nothing, route } from '@/lib/http/handler';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  PUT: handler(
    {
      as: 'grower',
      summary: 'Add a reading to an entry, or replace it',
      params: ReadingParams,
      body: ReadingBody,
      output: EntryView.shape.readings.element,
      find: findToCount,
    },
    async ({ db, actor, params, subject, body, ifMatch }) => {
      if (body.id !== undefined && body.id !== params.readingId) {
        throw new Invalid([{ path: 'id', message: 'is not the one in the address; leave it out' }]);
      }
      const saved = await saveReading(db, actor, subject.row, params.readingId, body, ifMatch);
      return json(readingView(saved.reading, saved.cutDate), {
        status: saved.created ? 201 : 200,
        etag: saved.reading.revision,
      });
    },
  ),
  DELETE: handler(
    { as: 'grower', summary: 'Take a reading out of an entry', params: ReadingParams, find: findToCount },
    async ({ db, actor, params, subject, ifMatch, audit }) => {
      await deleteReading(db, actor, subject.row, params.readingId, ifMatch);
      await audit({
        action: 'reading.deleted',
        subject: { kind: 'entry', id: params.id },
        detail: { reading: params.readingId },
      });
      return nothing;
    },
  ),
});
