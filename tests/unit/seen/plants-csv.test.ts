import { describe, expect, it } from 'vitest';
import { readPlants, TableError } from '@/lib/seen/plants-csv';

const columns = { count: 'count', alive: 'alive', group: 'site' };
const read = (text: string, wanted: Parameters<typeof readPlants>[1] = columns) =>
  readPlants(text, wanted).plants;

describe('a table of cut plants', () => {
  it('is read whatever its quotes, line ends, byte order mark and column order', () => {
    const expected = [
      { resprouted: true, shoots: 7, group: "Serra D'irta" },
      { resprouted: false, shoots: 0, group: 'Above the mill, left' },
    ];
    const rows = ["Serra D'irta,1,x,7", '"Above the mill, left",0,"a ""b""",0'];
    for (const end of ['\n', '\r\n', '\r']) {
      expect(read(['site,alive,other,count', ...rows, ''].join(end))).toEqual(expected);
    }
    expect(read(`\uFEFF${['site,alive,other,count', ...rows].join('\n')}\n\n`)).toEqual(expected);
    expect(read('"count" ; "alive" ; "site"\n7;1;Serra D\'irta\n0;0;Above the mill, left')).toEqual(expected);
  });

  it('takes empty and NA for unknown, never for zero', () => {
    expect(read('count,alive,site\n,1,A\nNA,NA,NA\n3,,')).toEqual([
      { resprouted: true, shoots: null, group: 'A' },
      { resprouted: null, shoots: null, group: '' },
      { resprouted: null, shoots: 3, group: '' },
    ]);
  });

  it.each(['1', 'yes', 'Yes', 'true', 'TRUE', 'T', '1.0'])('reads %s as alive', (said) => {
    expect(read(`count,alive,site\n3,${said},A`)[0]?.resprouted).toBe(true);
  });

  it.each(['0', 'no', 'NO', 'false', 'FALSE', 'F', '0.0'])('reads %s as not alive', (said) => {
    expect(read(`count,alive,site\n0,${said},A`)[0]?.resprouted).toBe(false);
  });

  it('says by the count alone what resprouted where no column does', () => {
    expect(read('count\n3\n0\nNA', { count: 'count' })).toEqual([
      { resprouted: true, shoots: 3, group: null },
      { resprouted: false, shoots: 0, group: null },
      { resprouted: null, shoots: null, group: null },
    ]);
  });

  it('points out plants that are not alive and yet have a count', () => {
    expect(
      readPlants('count,alive\n3,1\n2,0\n0,0\n4,no', { count: 'count', alive: 'alive' }).contradictions,
    ).toEqual([3, 5]);
  });

  it.each([
    ['count,alive,site\n-1,1,A', 'row 2, column "count": "-1" is no whole number'],
    ['count,alive,site\n2,1,A\n2.5,1,A', 'row 3, column "count": "2.5" is no whole number'],
    ['count,alive,site\nmany,1,A', 'row 2, column "count": "many" is no whole number'],
    ['count,alive,site\n\n1e99,1,A', 'row 3, column "count": "1e99" is no whole number'],
    ['count,alive,site\n2,maybe,A', 'row 2, column "alive": "maybe" is neither yes'],
    ['count,alive\n2,1', 'row 1: no column "site"; there are "count", "alive"'],
    ['count,alive,site,count\n2,1,A,3', 'row 1: two columns are called "count"'],
    ['count,alive,site\n2,1', 'row 2: 2 fields where the header has 3'],
    ['count,alive,site\n2,1,Above the mill, left', 'row 2: 4 fields where the header has 3'],
    ['count,alive,site\n2,1,"A', 'a quote is opened and never closed'],
    ['', 'the file is empty'],
    ['\n\n', 'the file is empty'],
  ])('that cannot be read is refused with its place (%j)', (text, message) => {
    expect(() => read(text)).toThrow(TableError);
    expect(() => read(text)).toThrow(message);
  });
});
