/** One column of the open data: what it holds, in which unit, and what a blank means. */
export type Column = {
  name: string;
  holds: string;
  unit?: string;
  values?: readonly string[];
  blank?: string;
};

/** The columns of `readings.csv`, in their order. One row is one accepted reading of one entry. */
export const READING_COLUMNS: readonly Column[] = [
  { name: 'entry', holds: 'the entry: one cut and all that was seen after it; /entries/<id> shows it' },
  { name: 'reading', holds: 'the reading: one return visit of that entry' },
  { name: 'species', holds: 'the species, as in the catalogue' },
  { name: 'genus', holds: 'its genus' },
  {
    name: 'wood',
    holds: 'class of its wood density: soft below 0.45 g/cm3, medium below 0.56, hard from 0.56',
    values: ['soft', 'medium', 'hard'],
    blank: 'density not known; the response model reads it as medium',
  },
  { name: 'severity', holds: 'how deep the cut went, 0 to 1', unit: 'fraction of length taken' },
  { name: 'class', holds: 'its class', values: ['uncut', 'light', 'moderate', 'heavy', 'severe'] },
  { name: 'severity_estimated', holds: '1 where only the class was known and its midpoint stands in' },
  {
    name: 'kind',
    holds: 'kind of cut',
    values: ['heading', 'reduction', 'thinning', 'pollarding', 'coppicing', 'none'],
  },
  { name: 'tip', holds: 'whether a growing tip was left', values: ['kept', 'removed'] },
  { name: 'weeks', holds: 'from the cut to this visit', unit: 'weeks (days / 7)' },
  { name: 'stage', holds: 'in leaf or dormant when cut', values: ['leaf', 'dormant'] },
  { name: 'sun', holds: 'light at the tree', values: ['full', 'part', 'shade'] },
  { name: 'wind', holds: 'wind at the tree', values: ['sheltered', 'breezy', 'exposed'] },
  { name: 'water', holds: 'water at the tree', values: ['dry', 'moderate', 'wet'] },
  {
    name: 'orchard',
    holds: 'a key that is the same for all entries of one orchard and says nothing else of it',
  },
  {
    name: 'grower',
    holds: 'a key that is the same for all entries of one grower and says nothing else of them',
  },
  { name: 'branches', holds: 'pruned branches counted at this visit, lost ones left out', unit: 'branches' },
  { name: 'count', holds: 'live new shoots of 2 cm or more on those branches together', unit: 'shoots' },
  {
    name: 'counts',
    holds: 'the same branch by branch, parted by ;',
    unit: 'shoots a branch',
    blank: 'only a total was counted; within the list, a branch lost for other reasons',
  },
  { name: 'thinned', holds: '1 where flush had been taken off at an earlier visit: not for summing up' },
  { name: 'cut_date', holds: 'date of the cut', unit: 'ISO 8601' },
  { name: 'date', holds: 'date of this visit', unit: 'ISO 8601' },
  { name: 'cultivar', holds: 'cultivar, as its grower wrote it', blank: 'not noted' },
  { name: 'intensity', holds: 'share of the tree’s limbs that were cut', unit: '0 to 1', blank: 'not noted' },
  { name: 'retained_length', holds: 'length left of each branch', unit: 'm', blank: 'not measured' },
  { name: 'diameter', holds: 'diameter of the branch at the cut', unit: 'm', blank: 'not measured' },
  { name: 'longest_shoot', holds: 'longest new shoot', unit: 'm', blank: 'not measured' },
  { name: 'dieback', holds: 'length of the retained end that died', unit: 'm', blank: 'not measured' },
  {
    name: 'removed',
    holds: 'shoots taken off at this visit, after the count',
    unit: 'shoots',
    blank: 'not noted',
  },
  { name: 'kept', holds: 'shoots left on at this visit', unit: 'shoots', blank: 'not noted' },
  { name: 'cell_latitude', holds: 'centre of the 0.1 degree cell of the orchard', unit: 'degrees' },
  { name: 'cell_longitude', holds: 'centre of the 0.1 degree cell of the orchard', unit: 'degrees' },
  { name: 'elevation', holds: 'elevation to 100 m', unit: 'm', blank: 'not noted' },
];
