import { describe, expect, it } from 'vitest';
import { ConditionRequired, Stale } from '@/lib/errors/errors';
import {
  allowRevision,
  requireAbsence,
  requireRevision,
  requireRevisionToRemove,
} from '@/lib/http/condition';

describe('a change to what exists', () => {
  it('goes ahead under the revision that stands', () => {
    expect(requireRevision(3, 3, false)).toBe('change');
  });

  it('changes nothing when the body is what is stored, with or without a condition', () => {
    expect(requireRevision(3, 3, true)).toBe('unchanged');
    expect(requireRevision(null, 3, true)).toBe('unchanged');
  });

  it('is refused without a condition when something would be overwritten', () => {
    expect(() => requireRevision(null, 3, false)).toThrow(ConditionRequired);
    expect(() => requireRevisionToRemove(null, 3)).toThrow(ConditionRequired);
  });

  it.each([2, 4, 0])('is stale under revision %i while 3 stands, whatever the body', (ifMatch) => {
    for (const sameBody of [true, false]) {
      const refusal = caught(() => requireRevision(ifMatch, 3, sameBody));
      expect(refusal).toBeInstanceOf(Stale);
      expect(refusal).toMatchObject({ status: 412, extra: { revision: 3 }, headers: { etag: '"3"' } });
    }
    expect(() => requireRevisionToRemove(ifMatch, 3)).toThrow(Stale);
    expect(() => allowRevision(ifMatch, 3)).toThrow(Stale);
  });

  it('needs no condition where nothing can be lost', () => {
    expect(() => allowRevision(null, 3)).not.toThrow();
    expect(() => allowRevision(3, 3)).not.toThrow();
  });
});

describe('making something', () => {
  it('needs no condition', () => {
    expect(() => requireAbsence(null)).not.toThrow();
  });

  it('is refused when the sender believed that it existed', () => {
    const refusal = caught(() => requireAbsence(1));
    expect(refusal).toBeInstanceOf(Stale);
    expect(refusal).toMatchObject({ status: 412, extra: { revision: null }, headers: {} });
  });
});

function caught(run: () => unknown): unknown {
  try {
    run();
  } catch (error) {
    return error;
  }
  throw new Error('nothing was thrown');
}
