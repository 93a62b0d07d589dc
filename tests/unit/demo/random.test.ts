import { describe, expect, it } from 'vitest';
import { gaussianBelow, negativeBinomialQuantile } from '@/lib/demo/negative-binomial';
import { seededRandom, xoshiro128 } from '@/lib/demo/random';

describe('the demo draws its chance from a stream of its own', () => {
  // The reference C code's outputs, as in the tests of Rust's rand_xoshiro 0.7.0 (xoshiro128starstar.rs).
  it('xoshiro128** gives the reference outputs for the state 1, 2, 3, 4', () => {
    const next = xoshiro128([1, 2, 3, 4]);
    expect(Array.from({ length: 10 }, next)).toEqual([
      11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804,
    ]);
  });

  it('repeats itself for the same seed and label, and differs for others', () => {
    const ten = (seed: number, label: string) => {
      const random = seededRandom(seed, label);
      return Array.from({ length: 10 }, () => random.uniform());
    };
    expect(ten(5, 'a')).toEqual(ten(5, 'a'));
    expect(ten(5, 'a')).not.toEqual(ten(5, 'b'));
    expect(ten(5, 'a')).not.toEqual(ten(6, 'a'));
  });

  it('a fork does not depend on what was drawn before it', () => {
    const fresh = seededRandom(1).fork('x').uniform();
    const used = seededRandom(1);
    used.uniform();
    expect(used.fork('x').uniform()).toBe(fresh);
  });

  it('Gaussians have mean 0 and variance 1', () => {
    const random = seededRandom(3);
    const draws = Array.from({ length: 40_000 }, () => random.normal());
    const mean = draws.reduce((sum, z) => sum + z, 0) / draws.length;
    const variance = draws.reduce((sum, z) => sum + (z - mean) ** 2, 0) / draws.length;
    expect(Math.abs(mean)).toBeLessThan(0.02);
    expect(Math.abs(variance - 1)).toBeLessThan(0.03);
  });

  it('a shuffle keeps every item', () => {
    expect(seededRandom(9).shuffled([1, 2, 3, 4, 5]).sort()).toEqual([1, 2, 3, 4, 5]);
  });
});

describe('counts are negative binomial', () => {
  // Abramowitz & Stegun (1964), table 26.1: P(1.96) = 0.97500 21.
  it('the share below 1.96 is 0.9750021', () => {
    expect(gaussianBelow(1.96)).toBeCloseTo(0.9750021, 6);
    expect(gaussianBelow(-1.96)).toBeCloseTo(1 - 0.9750021, 6);
    expect(gaussianBelow(0)).toBeCloseTo(0.5, 6);
  });

  it('the quantile is the smallest count that reaches the share', () => {
    // With size 1 this is geometric: F(y) = 1 - (mu / (1 + mu))^(y + 1), a closed form.
    const mu = 4;
    const below = (count: number) => 1 - (mu / (1 + mu)) ** (count + 1);
    for (const share of [0.05, 0.21, 0.5, 0.9, 0.999]) {
      const count = negativeBinomialQuantile(share, mu, 1);
      expect(below(count)).toBeGreaterThanOrEqual(share);
      if (count > 0) expect(below(count - 1)).toBeLessThan(share);
    }
  });

  it('mean and variance are mu and mu + mu²/theta (Hilbe 2011)', () => {
    const random = seededRandom(8);
    const draws = Array.from({ length: 60_000 }, () => negativeBinomialQuantile(random.uniform(), 6, 3));
    const mean = draws.reduce((sum, y) => sum + y, 0) / draws.length;
    const variance = draws.reduce((sum, y) => sum + (y - mean) ** 2, 0) / draws.length;
    expect(Math.abs(mean - 6)).toBeLessThan(0.1);
    expect(Math.abs(variance - 18)).toBeLessThan(0.7);
  });

  it('never passes what a branch can carry', () => {
    expect(negativeBinomialQuantile(1, 5000, 0.5)).toBe(999);
  });
});
