import { readingsCsv } from '@/lib/data/readings-csv';
import { handler, route } from '@/lib/http/handler';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    { as: 'all', summary: 'All accepted readings, one row a reading', outputType: 'text/csv' },
    async ({ db }) => {
      const pieces = readingsCsv(db);
      const encoder = new TextEncoder();
      const stream = new ReadableStream<Uint8Array>({
        async pull(controller) {
          const { done, value } = await pieces.next();
          if (done) controller.close();
          else controller.enqueue(encoder.encode(value));
        },
        async cancel() {
          await pieces.return(undefined);
        },
      });
      return new Response(stream, {
        headers: {
          'content-type': 'text/csv; charset=utf-8; header=present',
          'content-disposition': 'attachment; filename="aftercut-readings.csv"',
          'cache-control': 'no-store',
        },
      });
    },
  ),
});
