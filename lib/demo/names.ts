import type { Place } from './types';

/** Invented, all of it: the river Lirrow, its ring of growers, their names and their orchards. */
export const GIVEN_NAMES = words(
  'Adaeze Akua Anselm Bastien Chidi Dario Elif Emre Gustav Hanne Imani Ines Ingrid Joaquim Jonas Katya Kofi Leila ' +
    'Lucia Luis Marit Mateo Mina Noor Nuno Odile Oksana Paulo Petra Pilar Ravi Rosa Ruth Samir Sena Tekla Tomas ' +
    'Viola Wanjiru Yusuf',
);
export const FAMILY_NAMES = words(
  'Ashquill Brackwin Copperstane Corbane Dalmory Denverel Eskeram Fennerack Firlock Gosterly Halvane Istrel Jannery ' +
    'Kestrowe Lammerick Lorrimond Mirkell Norrabin Ombrel Ottermund Pashkey Pellowar Pendlory Quisley Rillane ' +
    'Rushavel Sablewick Sorrenby Stovemark Thessary Tressow Umberlane Undry Vossery Wetherane Whinnard Yarrowin ' +
    'Zellamy Orvane Tamlisk',
);

const GROUND = words(
  'Terrace Garden Orchard Slope Walled_garden Strip Hedgerows Paddock Bank Grove Old_rows Steps',
);
const WHERE = (
  'above the weir;by the ferry;below the mill;at the bend;under the cliff;behind the school;on the spur;' +
  'by the two bridges;at the sluice;over the ford;by the long wall;at the chapel steps;under the quarry;' +
  'by the drying floor;at the gravel bar;beyond the ropewalk;by the beehouse;on the landing;at the cattle trough;' +
  'by the lime kiln;under the aqueduct;at the toll gate;on the east bench;on the west bench'
).split(';');

/** Every name of an orchard there is, grounds and places paired. */
export const ORCHARD_NAMES = GROUND.flatMap((ground) => WHERE.map((where) => `${ground} ${where}`));

export const TREE_SPOTS = (
  'by the cistern;by the gate;at the corner;beside the shed;at the end of the row;by the steps;over the path;' +
  'by the compost;near the spring;against the wall;by the hives;on the bank;in the dip;by the track;behind the house;' +
  'at the top;by the water tank;under the wire;by the bench;next to the ditch'
).split(';');

export type CastMember = {
  name: string;
  orchard: string;
  elevationM: number;
  place: Place;
  species: string[];
};

/** Those who sign in, and those whose entries are written by hand: everyone else is drawn from the names above. */
export const GROWER: CastMember = {
  name: 'Ines Ombrel',
  orchard: 'Terrace above the weir',
  elevationM: 640,
  place: { sun: 'full', wind: 'sheltered', water: 'moderate' },
  species: [
    'ficus-carica',
    'morus-nigra',
    'persea-americana',
    'citrus-sinensis',
    'inga-edulis',
    'punica-granatum',
  ],
};
export const NEIGHBOUR: CastMember = {
  name: 'Tomas Halvane',
  orchard: 'Strip below the mill',
  elevationM: 590,
  place: { sun: 'part', wind: 'breezy', water: 'wet' },
  species: ['ficus-carica', 'coffea-arabica', 'citrus-limon', 'inga-edulis'],
};
export const HELPER_NAME = 'Sena Tressow';
export const MODERATOR_NAME = 'Ruth Pendlory';
export const ADMIN_NAME = 'Anselm Whinnard';

export const WRITERS: readonly CastMember[] = [
  writer(
    'Adaeze Quisley',
    'Garden by the ferry',
    40,
    'full breezy wet',
    'artocarpus-altilis mangifera-indica',
  ),
  writer('Kofi Rillane', 'Slope over the ford', 190, 'full breezy dry', 'mangifera-indica tamarindus-indica'),
  writer(
    'Noor Eskeram',
    'Grove at the sluice',
    330,
    'part sheltered wet',
    'gliricidia-sepium theobroma-cacao',
  ),
  writer(
    'Joaquim Dalmory',
    'Steps at the bend',
    460,
    'part sheltered moderate',
    'coffea-arabica inga-edulis',
  ),
  writer('Lucia Yarrowin', 'Bank by the long wall', 860, 'full exposed dry', 'morus-alba punica-granatum'),
  writer(
    'Bastien Corbane',
    'Old rows at the toll gate',
    1240,
    'full breezy moderate',
    'pyrus-communis corylus-avellana',
  ),
  writer(
    'Marit Undry',
    'Orchard under the quarry',
    1470,
    'full exposed moderate',
    'malus-domestica prunus-domestica',
  ),
  writer(
    'Hanne Firlock',
    'Paddock at the cattle trough',
    1640,
    'full exposed wet',
    'salix-viminalis betula-pendula',
  ),
];

function writer(
  name: string,
  orchard: string,
  elevationM: number,
  place: string,
  species: string,
): CastMember {
  const [sun, wind, water] = place.split(' ') as [Place['sun'], Place['wind'], Place['water']];
  return { name, orchard, elevationM, place: { sun, wind, water }, species: species.split(' ') };
}

function words(list: string): string[] {
  return list.split(' ').map((word) => word.replaceAll('_', ' '));
}
