import { describe, expect, it } from 'vitest';
import * as oneRoute from '@/app/api/species/[slug]/route';
import * as listRoute from '@/app/api/species/route';
import type { Page } from '@/lib/lists/cursor';
import type { SpeciesView } from '@/lib/species/view';
import { call, read } from './setup/request';

const list = (query: string) => call(listRoute, 'GET', `/api/species${query}`, {});
const found = async (query: string) => read<Page<SpeciesView>>(await list(query));
const one = (slug: string) => call(oneRoute, 'GET', `/api/species/${slug}`, { params: { slug } });

describe('the catalogue, for everyone', () => {
  it('is found by a name in another language, accents and case optional', async () => {
    for (const q of ['higuera', 'HIGUÉRA', 'figuier', 'ficus carica']) {
      const { items } = await found(`?q=${encodeURIComponent(q)}`);
      expect(items[0]?.slug).toBe('ficus-carica');
    }
    expect(await found('?q=zzz')).toEqual({ items: [], nextCursor: null });
  });

  it('is paged: all 207 once each, whatever the size of a page', async () => {
    for (const limit of [1, 50, 69, 200]) {
      const slugs: string[] = [];
      let cursor = '';
      do {
        const page = await found(`?limit=${limit}${cursor}`);
        slugs.push(...page.items.map(({ slug }) => slug));
        expect(page.items.length).toBeGreaterThan(0);
        cursor = page.nextCursor ? `&cursor=${page.nextCursor}` : '';
      } while (cursor !== '' && slugs.length <= 207);
      expect(slugs).toHaveLength(207);
      expect(new Set(slugs).size).toBe(207);
    }
  });

  it.each(['?limit=0', '?limit=201', '?limit=x', '?colour=green', `?q=${'a'.repeat(501)}`, '?cursor=x'])(
    'answers 422 to %s',
    async (query) => {
      expect((await list(query)).status).toBe(422);
    },
  );

  it('answers 422 to a cursor that another question gave', async () => {
    const { nextCursor } = await found('?limit=1');
    expect((await list(`?q=fig&cursor=${nextCursor}`)).status).toBe(422);
  });

  it('gives one species with its class, its sources and its cautions, not sprouting first', async () => {
    expect(await read(await one('pinus-sylvestris'))).toMatchObject({
      name: 'Scots pine',
      wood: 'soft',
      plant: 'conifer',
      woodDensity: { value: 0.395, records: 5, level: 'species', source: 'zanne-2009' },
      resprouts: { degree: 'no', fromOldWood: 'no', sources: ['usda-plants'], oldWoodSources: ['memory'] },
    });
    const { cautions } = await read<SpeciesView>(await one('pinus-sylvestris'));
    expect(cautions[0]).toMatchObject({
      code: 'no-resprout',
      title: 'Does not resprout from old bare wood.',
    });
    expect(new Set(cautions.map(({ code }) => code)).size).toBe(cautions.length);
  });

  it('knows nothing of a species that is not in it', async () => {
    for (const slug of ['ficus-nowhere', '..%2Fsources', 'a'.repeat(80)]) {
      expect((await one(slug)).status).toBe(404);
    }
  });
});
