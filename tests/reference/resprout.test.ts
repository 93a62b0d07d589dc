import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { sumUpPlants } from '@/lib/seen/plants';
import { readPlants } from '@/lib/seen/plants-csv';

const file = (name: string) => readFileSync(new URL(`./resprout/${name}`, import.meta.url), 'utf8');

interface Figures {
  plants_cut: number;
  resprouted: number;
  share: number;
  share_wilson95: [number, number];
  per_resprouting_plant: { n: number; mean: number; sd: number };
  per_cut_plant: { n: number; mean: number; sd: number };
  sites: { site: string; cut: number; resprouted: number; n: number; mean: number; sd: number }[];
}

describe('plants of Zomer, Moreira & Pausas (2025), doi 10.1093/jxb/eraf246, summed up as R 4.2.2 does', () => {
  const figures = JSON.parse(file('plants.json')) as Figures;
  const { plants, contradictions } = readPlants(file('plants.csv'), {
    count: 'count',
    alive: 'resprouted',
    group: 'site',
  });
  const { all, groups } = sumUpPlants(plants);
  const same = (ours: number | null, theirs: number) => {
    expect(ours).not.toBeNull();
    expect(Math.abs((ours ?? Infinity) - theirs)).toBeLessThan(1e-9);
  };

  it('all together, to 1e-9', () => {
    expect([all.cut, all.resprouted]).toEqual([figures.plants_cut, figures.resprouted]);
    same(all.share, figures.share);
    same(all.wilson95?.[0] ?? null, figures.share_wilson95[0]);
    same(all.wilson95?.[1] ?? null, figures.share_wilson95[1]);
    expect([all.perResprouting.n, all.perCut.n]).toEqual([
      figures.per_resprouting_plant.n,
      figures.per_cut_plant.n,
    ]);
    same(all.perResprouting.mean, figures.per_resprouting_plant.mean);
    same(all.perResprouting.sd, figures.per_resprouting_plant.sd);
    same(all.perCut.mean, figures.per_cut_plant.mean);
    same(all.perCut.sd, figures.per_cut_plant.sd);
  });

  it('site by site, to 1e-9', () => {
    expect(Object.keys(groups).sort()).toEqual(figures.sites.map(({ site }) => site).sort());
    for (const theirs of figures.sites) {
      const ours = groups[theirs.site];
      expect([ours?.cut, ours?.resprouted, ours?.perResprouting.n]).toEqual([
        theirs.cut,
        theirs.resprouted,
        theirs.n,
      ]);
      same(ours?.perResprouting.mean ?? null, theirs.mean);
      same(ours?.perResprouting.sd ?? null, theirs.sd);
    }
  });

  it('with nothing in the table that contradicts itself', () => {
    expect(contradictions).toEqual([]);
  });
});
