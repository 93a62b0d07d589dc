import { describe, expect, it } from 'vitest';
import { RING_SPECIES } from '@/lib/demo/species';
import { speciesBySlug } from '@/lib/species/catalogue';

describe('what the ring grows is in the catalogue', () => {
  it.each(RING_SPECIES)(
    '$slug, with the same genus, wood and sprouting',
    ({ slug, genus, wood, resprouts, fromOldWood }) => {
      const known = speciesBySlug(slug);
      expect(known).toMatchObject({ genus, wood, resprouts: { degree: resprouts, fromOldWood } });
    },
  );
});
