import type { EntryContent, EntryStatus } from '@/lib/entries/schema';

export type Place = {
  sun: 'full' | 'part' | 'shade';
  wind: 'sheltered' | 'breezy' | 'exposed';
  water: 'dry' | 'moderate' | 'wet';
};

export interface DemoPerson {
  id: string;
  name: string;
  email: string;
  role: 'grower' | 'moderator' | 'admin';
  /** Whether the demo's password opens this account; the ring's other growers cannot sign in. */
  signsIn: boolean;
  units: 'metric' | 'imperial';
  createdAt: Date;
}

export interface DemoOrchard {
  id: string;
  ownerId: string;
  name: string;
  latitude: number;
  longitude: number;
  elevationM: number;
  timeZone: string;
  place: Place;
  createdAt: Date;
}

export interface DemoMember {
  orchardId: string;
  personId: string;
  joinedAt: Date;
}

export interface DemoTree {
  id: string;
  orchardId: string;
  label: string;
  species: string;
  cultivar: string | null;
  yearPlanted: number | null;
  createdAt: Date;
}

/** Why an entry is in the demo, for tests and for the notes that stand beside it. */
export type Origin = 'generated' | 'handwritten' | 'double' | 'per-tree' | 'own';

export interface DemoEntry {
  id: string;
  ownerId: string;
  origin: Origin;
  status: EntryStatus;
  /** What everyone sees once accepted, else what its owner last wrote. */
  content: EntryContent;
  /** A change to an accepted entry that was not sent for reading yet. */
  pending: EntryContent | null;
  returnedNote: string | null;
  /** Who typed each reading, in the readings' order. */
  readBy: string[];
  createdAt: Date;
  savedAt: Date;
  waitingSince: Date | null;
  acceptedAt: Date | null;
}

export interface Demo {
  people: DemoPerson[];
  orchards: DemoOrchard[];
  members: DemoMember[];
  trees: DemoTree[];
  entries: DemoEntry[];
}

export interface DemoOptions {
  seed: number;
  /** The day of the seeding, ISO: nothing in the demo lies after it. */
  today: string;
  /** Entries with at least one reading. */
  entries?: number;
  growers?: number;
  orchards?: number;
  species?: number;
  /** Entries written by hand, part of `entries`. */
  handwritten?: readonly Handwritten[];
}

/** An entry of content/demo, its cut and readings dated by the calendar, not by a year. */
export interface Handwritten {
  slug: string;
  title: string;
  writer: string;
  species: string;
  cultivar: string | null;
  tree: string;
  planted: number | null;
  place: Place;
  /** Month and day of the cut, "02-11": the latest one whose last reading is past. */
  day: string;
  cut: Omit<EntryContent['cut'], 'date' | 'dateApproximate'>;
  readings: (Omit<EntryContent['readings'][number], 'id' | 'date' | 'dateApproximate'> & { days: number })[];
  /** The document; reading blocks carry their place in `readings` ("1", "2") where an id will stand. */
  doc: DocNode;
}

export type DocNode = {
  type: string;
  attrs?: Record<string, unknown>;
  content?: DocNode[];
  text?: string;
  marks?: { type: string; attrs?: Record<string, unknown> }[];
};
