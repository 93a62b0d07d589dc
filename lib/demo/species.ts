/** Where along the valley a tree is grown: metres above the sea. */
export interface Band {
  readonly fromM: number;
  readonly toM: number;
}

/** One of the forty the ring grows: what the generator needs to know of it. Slugs are the catalogue's. */
export interface RingSpecies {
  readonly slug: string;
  readonly genus: string;
  readonly wood: 'soft' | 'medium' | 'hard' | null;
  readonly name: string;
  readonly band: Band;
  readonly leaf: 'evergreen' | 'deciduous';
  /** How freely it resprouts, and whether from old wood: as in the catalogue. */
  readonly resprouts: 'freely' | 'moderately' | 'weakly';
  readonly fromOldWood: 'yes' | 'weak' | 'no';
  /** Share of the ring's work, against one another. */
  readonly grown: number;
  /** Length of a strong shoot by the end of a season, metres. */
  readonly vigourM: number;
  /** Whether it is grown for something to pick. */
  readonly bears: boolean;
  readonly cultivars: readonly string[];
}

const WARM: Band = { fromM: 20, toM: 520 };
const MIDDLE: Band = { fromM: 300, toM: 1150 };
const COOL: Band = { fromM: 900, toM: 1900 };

type Short = [
  slug: string,
  wood: 'soft' | 'medium' | 'hard' | null,
  name: string,
  grown: number,
  vigourM: number,
  cultivars?: string,
];
type Habit = Pick<RingSpecies, 'leaf' | 'resprouts' | 'fromOldWood'>;

const NOT_FOR_PICKING = new Set([
  'salix',
  'gliricidia',
  'erythrina',
  'alnus',
  'grevillea',
  'tilia',
  'betula',
]);

const FREE_EVERGREEN: Habit = { leaf: 'evergreen', resprouts: 'freely', fromOldWood: 'yes' };
const FREE_LEAFLESS: Habit = { leaf: 'deciduous', resprouts: 'freely', fromOldWood: 'yes' };

/** Cultivar names are invented. In order of how long the ring has grown each, so that the first n can be taken. */
export const RING_SPECIES: readonly RingSpecies[] = [
  grown(['ficus-carica', 'soft', 'fig', 9, 1.1, 'Lantern;Old Weir'], MIDDLE, FREE_LEAFLESS),
  grown(
    ['malus-domestica', 'hard', 'apple', 9, 0.7, 'Gate Latch;Ring Russet;Late Bell'],
    COOL,
    FREE_LEAFLESS,
  ),
  grown(['mangifera-indica', 'medium', 'mango', 8, 0.5, 'Ferry Long;Small Sweet'], WARM, FREE_EVERGREEN),
  grown(['morus-alba', 'hard', 'white mulberry', 6, 1.6], MIDDLE, FREE_LEAFLESS),
  grown(['corylus-avellana', 'medium', 'hazel', 5, 1.3], COOL, FREE_LEAFLESS),
  grown(['artocarpus-altilis', 'soft', 'breadfruit', 5, 0.8, 'Broadleaf;Seven Ribs'], WARM, FREE_EVERGREEN),
  grown(['pyrus-communis', 'hard', 'pear', 5, 0.7, 'Pound Weight;Green Ladder'], COOL, FREE_LEAFLESS),
  grown(['salix-viminalis', 'soft', 'osier', 4, 2.2], COOL, FREE_LEAFLESS),
  grown(['persea-americana', 'medium', 'avocado', 5, 0.7, 'Thickneck'], MIDDLE, FREE_EVERGREEN),
  grown(['gliricidia-sepium', 'hard', 'gliricidia', 4, 1.8], WARM, FREE_LEAFLESS),
  grown(['coffea-arabica', 'hard', 'coffee', 4, 0.6], MIDDLE, FREE_EVERGREEN),
  grown(['prunus-domestica', 'hard', 'plum', 4, 0.8, 'Blue Hour'], COOL, FREE_LEAFLESS),
  grown(['citrus-sinensis', 'hard', 'sweet orange', 3.5, 0.5], MIDDLE, FREE_EVERGREEN),
  grown(['morus-nigra', 'medium', 'black mulberry', 3, 0.9], MIDDLE, FREE_LEAFLESS),
  grown(['moringa-oleifera', 'soft', 'moringa', 3, 2.0], WARM, FREE_EVERGREEN),
  grown(['inga-edulis', 'hard', 'ice-cream bean', 3, 1.2], MIDDLE, FREE_EVERGREEN),
  grown(['prunus-persica', 'hard', 'peach', 3, 0.8], COOL, {
    leaf: 'deciduous',
    resprouts: 'moderately',
    fromOldWood: 'weak',
  }),
  grown(['theobroma-cacao', 'soft', 'cacao', 3, 0.7], WARM, FREE_EVERGREEN),
  grown(['psidium-guajava', 'hard', 'guava', 3, 0.7], WARM, FREE_EVERGREEN),
  grown(['salix-alba', 'soft', 'white willow', 2.5, 2.0], COOL, FREE_LEAFLESS),
  grown(['erythrina-poeppigiana', 'soft', 'mountain immortelle', 2.5, 1.6], MIDDLE, FREE_LEAFLESS),
  grown(['castanea-sativa', 'medium', 'sweet chestnut', 2.5, 1.4], COOL, FREE_LEAFLESS),
  grown(['annona-cherimola', 'medium', 'cherimoya', 2, 0.6], MIDDLE, {
    leaf: 'deciduous',
    resprouts: 'moderately',
    fromOldWood: 'yes',
  }),
  grown(['citrus-aurantiifolia', 'hard', 'lime', 2, 0.5], WARM, FREE_EVERGREEN),
  grown(['alnus-acuminata', 'soft', 'Andean alder', 2, 1.3], COOL, FREE_LEAFLESS),
  grown(['punica-granatum', 'hard', 'pomegranate', 2, 0.9], MIDDLE, FREE_LEAFLESS),
  grown(['artocarpus-heterophyllus', 'medium', 'jackfruit', 2, 0.7], WARM, FREE_EVERGREEN),
  grown(['sambucus-nigra', 'soft', 'elder', 1.8, 1.5], COOL, FREE_LEAFLESS),
  grown(['annona-muricata', 'soft', 'soursop', 1.8, 0.6], WARM, {
    leaf: 'evergreen',
    resprouts: 'moderately',
    fromOldWood: 'yes',
  }),
  grown(['cydonia-oblonga', null, 'quince', 1.5, 0.8], COOL, FREE_LEAFLESS),
  grown(['juglans-regia', 'medium', 'walnut', 1.5, 0.7], COOL, {
    leaf: 'deciduous',
    resprouts: 'moderately',
    fromOldWood: 'weak',
  }),
  grown(['citrus-limon', 'hard', 'lemon', 1.5, 0.7], MIDDLE, FREE_EVERGREEN),
  grown(['eriobotrya-japonica', 'hard', 'loquat', 1.3, 0.5], MIDDLE, FREE_EVERGREEN),
  grown(['tamarindus-indica', 'hard', 'tamarind', 1.2, 0.5], WARM, FREE_EVERGREEN),
  grown(['spondias-dulcis', 'soft', 'June plum', 1.2, 0.9], WARM, FREE_LEAFLESS),
  grown(['grevillea-robusta', 'medium', 'silky oak', 1, 1.0], MIDDLE, FREE_EVERGREEN),
  grown(['tilia-cordata', 'soft', 'small-leaved lime', 1, 1.2], COOL, FREE_LEAFLESS),
  grown(['feijoa-sellowiana', 'hard', 'feijoa', 0.9, 0.4], MIDDLE, FREE_EVERGREEN),
  grown(['betula-pendula', 'medium', 'birch', 0.7, 0.4], COOL, {
    leaf: 'deciduous',
    resprouts: 'weakly',
    fromOldWood: 'no',
  }),
  grown(['diospyros-kaki', 'hard', 'persimmon', 0.6, 0.5], MIDDLE, {
    leaf: 'deciduous',
    resprouts: 'moderately',
    fromOldWood: 'yes',
  }),
];

const BY_SLUG = new Map(RING_SPECIES.map((species) => [species.slug, species]));

/** @throws Error for a species the ring does not grow. */
export function ringSpecies(slug: string): RingSpecies {
  const found = BY_SLUG.get(slug);
  if (!found) throw new Error(`the ring grows no ${slug}`);
  return found;
}

function grown([slug, wood, name, share, vigourM, cultivars]: Short, band: Band, habit: Habit): RingSpecies {
  const genus = slug.split('-')[0] ?? slug;
  return {
    slug,
    genus: genus.charAt(0).toUpperCase() + genus.slice(1),
    wood,
    name,
    band,
    ...habit,
    grown: share,
    vigourM,
    bears: !NOT_FOR_PICKING.has(genus),
    cultivars: cultivars?.split(';') ?? [],
  };
}
