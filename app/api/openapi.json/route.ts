import { handler, json, route } from '@/lib/http/handler';
import { openapi } from '@/lib/http/openapi';
import * as people from '../admin/people/route';
import * as role from '../admin/people/[id]/role/route';
import * as disable from '../admin/people/[id]/disable/route';
import * as enable from '../admin/people/[id]/enable/route';
import * as decision from '../bench/entries/[id]/decision/route';
import * as queue from '../bench/queue/route';
import * as codebook from '../data/codebook.json/route';
import * as readingsCsv from '../data/readings.csv/route';
import * as entries from '../entries/route';
import * as entry from '../entries/[id]/route';
import * as draft from '../entries/[id]/draft/route';
import * as reading from '../entries/[id]/readings/[readingId]/route';
import * as revisions from '../entries/[id]/revisions/route';
import * as submit from '../entries/[id]/submit/route';
import * as health from '../health/route';
import * as species from '../species/route';
import * as oneSpecies from '../species/[slug]/route';
import * as response from '../species/[slug]/response/route';
import * as account from '../account/route';
import * as orchards from '../orchards/route';
import * as orchard from '../orchards/[id]/route';
import * as members from '../orchards/[id]/members/route';
import * as tree from '../orchards/[id]/trees/[treeId]/route';
import * as constant from '../measure/constant/route';
import * as signUp from '../sign-up/route';

/** Every route with its address; a test holds this list to the folders of app/api. */
const routes = {
  '/api/account': account,
  '/api/admin/people': people,
  '/api/admin/people/{id}/disable': disable,
  '/api/admin/people/{id}/enable': enable,
  '/api/admin/people/{id}/role': role,
  '/api/bench/entries/{id}/decision': decision,
  '/api/bench/queue': queue,
  '/api/data/codebook.json': codebook,
  '/api/data/readings.csv': readingsCsv,
  '/api/entries': entries,
  '/api/entries/{id}': entry,
  '/api/entries/{id}/draft': draft,
  '/api/entries/{id}/readings/{readingId}': reading,
  '/api/entries/{id}/revisions': revisions,
  '/api/entries/{id}/submit': submit,
  '/api/health': health,
  '/api/measure/constant': constant,
  '/api/orchards': orchards,
  '/api/orchards/{id}': orchard,
  '/api/orchards/{id}/members': members,
  '/api/orchards/{id}/trees/{treeId}': tree,
  '/api/sign-up': signUp,
  '/api/species': species,
  '/api/species/{slug}': oneSpecies,
  '/api/species/{slug}/response': response,
};

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler({ as: 'all', summary: 'This description of the API' }, async () => json(openapi(routes))),
});
