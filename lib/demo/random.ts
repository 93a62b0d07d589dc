/** Draws that come out the same for the same seed on every machine: the demo's only source of chance. */
export interface Random {
  /** Uniform over 0 (included) to 1 (left out), in steps of 2^-32. */
  uniform(): number;
  /** Whole number from `low` to `high`, both included. */
  whole(low: number, high: number): number;
  /** True with this chance. */
  chance(share: number): boolean;
  /** Gaussian, by Box and Muller (1958), Ann. Math. Statist. 29:610-611. */
  normal(mean?: number, sd?: number): number;
  pick<T>(items: readonly T[]): T;
  /** One of the items, each as likely as its weight is heavy. */
  weighted<T>(items: readonly T[], weight: (item: T) => number): T;
  shuffled<T>(items: readonly T[]): T[];
  /** A stream of its own, so that a change in one part of the demo does not shift all others. */
  fork(label: string): Random;
}

/**
 * xoshiro128** by Blackman & Vigna (2021), "Scrambled linear pseudorandom number generators", ACM Trans. Math.
 * Softw. 47(4):36, as 32-bit whole numbers. The state must not be all zero.
 */
export function xoshiro128(state: readonly [number, number, number, number]): () => number {
  let [a, b, c, d] = state;
  return () => {
    const result = Math.imul(rotate(Math.imul(b, 5), 7), 9) >>> 0;
    const shifted = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= shifted;
    d = rotate(d, 11);
    return result;
  };
}

export function seededRandom(seed: number, label = ''): Random {
  const next = xoshiro128(stateOf(seed, label));
  const uniform = () => next() / 2 ** 32;
  const whole = (low: number, high: number) => low + Math.floor(uniform() * (high - low + 1));
  const pick = <T>(items: readonly T[]): T => {
    if (items.length === 0) throw new RangeError('nothing to pick from');
    return items[whole(0, items.length - 1)] as T;
  };
  return {
    uniform,
    whole,
    pick,
    chance: (share) => uniform() < share,
    normal: (mean = 0, sd = 1) =>
      mean + sd * Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform()),
    weighted(items, weight) {
      let left = uniform() * items.reduce((sum, item) => sum + weight(item), 0);
      return items.find((item) => (left -= weight(item)) < 0) ?? pick(items);
    },
    shuffled(items) {
      const mixed = [...items];
      for (let last = mixed.length - 1; last > 0; last--) {
        const other = whole(0, last);
        [mixed[last], mixed[other]] = [mixed[other] as (typeof mixed)[0], mixed[last] as (typeof mixed)[0]];
      }
      return mixed;
    },
    fork: (more) => seededRandom(seed, `${label}/${more}`),
  };
}

/** FNV-1a over the label, then SplitMix32 steps, so that near seeds give far states. Both from memory. */
function stateOf(seed: number, label: string): [number, number, number, number] {
  let mixed = (0x811c9dc5 ^ seed) >>> 0;
  for (const character of label) mixed = Math.imul(mixed ^ (character.codePointAt(0) ?? 0), 0x01000193) >>> 0;
  const word = () => {
    mixed = (mixed + 0x9e3779b9) >>> 0;
    let z = mixed;
    z = Math.imul(z ^ (z >>> 16), 0x85ebca6b);
    z = Math.imul(z ^ (z >>> 13), 0xc2b2ae35);
    return (z ^ (z >>> 16)) >>> 0;
  };
  return [word(), word(), word(), word() | 1];
}

function rotate(value: number, by: number): number {
  return (value << by) | (value >>> (32 - by));
}
