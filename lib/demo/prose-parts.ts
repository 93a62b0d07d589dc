import type { Cut } from '@/lib/entries/schema';

type Parts<Key extends string> = Record<Key, readonly string[]>;

/** Sentences that are true of any entry with that value: `{tree}` is the species' plain name. */
export const WHY: Parts<NonNullable<Cut['aim']>> = {
  size: [
    'It had outgrown the ladder, so down it came.',
    'Too tall to pick without climbing.',
    'The top was taking all the light and giving us nothing we could reach.',
    'I want every fruit of this {tree} within arm\u2019s length of the ground or the third rung.',
  ],
  width: [
    'This {tree} was going straight up. I want it out over the path instead.',
    'Opened to the sides; height is not what is missing here.',
    'A wider crown picks better and stands the wind better, we think.',
    'Cut to outward buds, to make it spread.',
  ],
  fruit: [
    'It carried little last time and only at the ends.',
    'All leaf and no crop inside the crown, so in goes some light.',
    'The bearing wood was old and thin. Time for new.',
    'To see whether young wood on this {tree} sets better than the old.',
  ],
  shade: [
    'The beds underneath had stopped growing.',
    'The young plants below want sun by midday.',
    'Too dark under this {tree}; the seedlings were leaning.',
    'It shaded more than the ground under it can bear.',
  ],
  shape: [
    'Two limbs were fighting over one place.',
    'A lopsided {tree}: all of it leaned downhill.',
    'Crossing wood out first, then these.',
    'Mostly tidying, with these branches marked to see what they would do.',
  ],
  health: [
    'There was dead wood in the crown and I cut back to sound.',
    'Cankered ends, taken off well below the mark. Blades wiped between branches.',
    'Storm breaks, made clean.',
    'It had been looking thin. Cut to live wood and fed it.',
  ],
  rejuvenation: [
    'An old {tree} that nobody had touched in years. First part of three.',
    'Brought back hard, but only a share of the limbs; the rest in another season.',
    'Either this wakes it or it comes out.',
    'The old framework is sound. The wood on it is tired.',
  ],
  other: ['We needed the poles.', 'A neighbour asked for scion wood.'],
};

export const CUT_MADE: Parts<NonNullable<Cut['kind']>> = {
  heading: [
    'Headed all the marked branches on the same morning.',
    'Each one cut just above a bud, sloping away from it.',
    'Cut with the bypass loppers, no stubs.',
    'Same cut on each branch, as near as the eye goes.',
    'Marked with tape first, then cut, so the tape chose and not the mood.',
  ],
  reduction: [
    'Cut back to a side branch each time, one stout enough to take over.',
    'Every cut goes to a fork; nothing ends in the middle of nowhere.',
    'Shortened to laterals, so the outline stays what it was, only smaller.',
    'Reduced to strong side branches and left the rest alone.',
  ],
  thinning: [
    'Side branches taken out whole at the collar, nothing shortened.',
    'Taken off where they start. No stubs, no heading.',
    'A saw and patience: whole side branches, one at a time.',
  ],
  pollarding: [
    'Back to the old heads, all of them.',
    'Poles off at the knuckle, knuckle left whole.',
    'Cut to the heads as every time; the poles went to the bean rows.',
  ],
  coppicing: [
    'Down to the stool, low and sloping so that rain runs off.',
    'All stems to the ground; the bundle was too heavy for one.',
    'Stool cut clean and fenced from the goats.',
  ],
  none: [
    'Not cut: taped and left, on the day its neighbours were.',
    'A branch to compare with. Nothing was done to it.',
    'Left alone on purpose. The tape is all it got.',
  ],
};

/** A heading that spared the branch's own tip. */
export const SIDES_HEADED = [
  'Headed the side growth and let the branch itself run on.',
  'The side shoots shortened all along; the end is as it was.',
  'Shortened what grows from the sides, nothing else.',
];

/** Sentences for trees that are grown for something to pick. */
export const ABOUT_CROPS = /pick|fruit|bear|crop|carried|reach|arm/;

/** Where one branch alone was marked. */
export const ONE_BRANCH = [
  'One branch, one tape.',
  'One branch marked; there was no second like it.',
  'A single branch, so read it as that and no more.',
];

export const TIP_LEFT: Parts<'kept' | 'removed'> = {
  kept: ['The tips stay on.', 'Every one keeps its growing end.', 'Leader and tips untouched.'],
  removed: ['No tip left on any of them.', 'They all end in a cut face.', 'The ends are gone on every one.'],
};

export const PLACE_SAID = {
  sun: {
    full: ['Sun on it from breakfast on.', 'Nothing shades it.'],
    part: ['Gets the morning and not much after.', 'Half its day is under the neighbours.'],
    shade: ['It never sees the sun for long.', 'Deep in the shade, which may say more than my cut does.'],
  },
  water: {
    dry: ['The ground was dust when I cut.', 'No water there but what falls.'],
    moderate: ['Ground neither wet nor dry.', 'Mulched, and watered when I think of it.'],
    wet: ['Its feet are in the seep all year.', 'Wet enough that boots stay behind.'],
  },
  wind: {
    sheltered: ['Out of the wind there.', 'The bank keeps the wind off.'],
    breezy: ['There is always some air moving.', 'A bit of wind most afternoons.'],
    exposed: ['It takes the wind from two sides.', 'Everything leans there.'],
  },
} as const;

export const SEEN = {
  nothing: ['Nothing yet.', 'Bare. Some buds look round, but none I could count.', 'Not a shoot to count.'],
  first: [
    'It has moved.',
    'First count.',
    'More than I would have said from the ground.',
    'Counted twice, same both times.',
  ],
  rising: [
    'Still pushing.',
    'Clearly more than last time.',
    'It has not finished.',
    'New ones between the old.',
  ],
  level: [
    'No more than last time, give or take: the flush is in.',
    'Same picture as before, only longer.',
    'It has settled.',
  ],
  falling: [
    'Fewer than before: the weak ones have gone.',
    'Some of the small ones dried up.',
    'It is thinning itself.',
  ],
  uneven: [
    'One branch has done most of it.',
    'Very uneven from branch to branch.',
    'Same tree, same day, same cut, and no two alike.',
  ],
  even: ['Much the same on each.', 'Oddly even.', 'No great difference between the branches.'],
  bare: [
    'At least one stayed bare.',
    'Not every branch answered.',
    'A zero among them, and it is a real one.',
  ],
  lost: [
    'One is missing from here on and left out, not counted as nothing.',
    'A dash stands for the one that broke.',
  ],
  thinned: [
    'Then took flush off by hand and kept what points outward.',
    'Counted first, then thinned: the undersides went.',
    'After the count I rubbed off what crosses and left a few on each.',
  ],
  after: [
    'This is after the thinning, so it says little about the cut.',
    'What stands now is what I left, and a few latecomers.',
  ],
} as const;

export const SAP_GENERA = new Set(['Ficus', 'Mangifera', 'Artocarpus', 'Morus', 'Citrus']);
export const SAP_SAID = [
  'Long sleeves and gloves for the sap.',
  'Gloves on; this sap is no friend of skin.',
  'Kept the sap off my arms this time.',
];

export const LESSON = [
  'Would do it the same way again.',
  'Next time the same cut on half as many branches.',
  'I should have come back sooner.',
  'I would like to know what others got.',
  'The branch I would have bet on did least.',
  'A second tape on each branch would have saved me looking.',
  'Not what I expected, which is why I write it down.',
  'Next round I leave one uncut beside them.',
];
