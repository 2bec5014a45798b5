import { describe, expect, it } from 'vitest';
import { pointsInto } from '@/lib/review/rules/json-pointer';
import { followsFrom, outcomeOf } from '@/lib/review/rules/outcome';
import { findWarnings, type DeskFacts } from '@/lib/review/rules/warnings';

const ITEMS = [{ key: 'identity' }, { key: 'evidence' }];
const result = (key: string, given: 'passed' | 'failed' | 'not-applicable') => ({ key, result: given });

describe('the outcome of a checklist', () => {
  it('is verified with every item passed or not applicable', () => {
    expect(outcomeOf(ITEMS, [result('identity', 'passed'), result('evidence', 'not-applicable')])).toBe('verified');
  });

  it('is not verified with one failed, though others have no result yet', () => {
    expect(outcomeOf(ITEMS, [result('evidence', 'failed')])).toBe('not-verified');
  });

  it('is open until each item has a result, and a result of an unknown item is none', () => {
    expect(outcomeOf(ITEMS, [result('identity', 'passed'), result('weather', 'passed')])).toBe('incomplete');
    expect(outcomeOf(ITEMS, [])).toBe('incomplete');
  });

  it('allows verifying when verified, and nothing but returning or declining when not', () => {
    const verdicts = ['verified', 'changes-requested', 'declined'] as const;
    const allowed = (outcome: Parameters<typeof followsFrom>[0]) =>
      verdicts.filter((verdict) => followsFrom(outcome, verdict));
    expect(allowed('verified')).toEqual(['verified']);
    expect(allowed('not-verified')).toEqual(['changes-requested', 'declined']);
    expect(allowed('incomplete')).toEqual([]);
  });
});

describe('a JSON pointer', () => {
  const content = { phases: [{ note: '' }], 'a/b': { '~': null } };

  it.each(['/phases', '/phases/0/note', '/a~1b/~0'])('leads somewhere: %s', (pointer) => {
    expect(pointsInto(content, pointer)).toBe(true);
  });

  it.each(['/phases/1', '/phases/0/mean', '/constructor', '/phases/0/note/length'])('leads nowhere: %s', (pointer) => {
    expect(pointsInto(content, pointer)).toBe(false);
  });
});

type Report = DeskFacts['report'];
const FIGURE: Report['figures'][number] = {
  id: 1,
  modeCode: 'idle',
  modeName: 'Idle',
  quantity: 'mean-power',
  powerKind: 'real',
  value: 8,
  standardUncertainty: 0.1,
  censoredAt: null,
  averagingSeconds: 600,
  coverage: null,
  countedSeconds: 600,
  parts: { gain: 0, offset: 0, resolution: 0, repeatability: 0, drift: 0, belowLimit: 0 },
  setAside: null,
};
const PHASE = {
  source: 'typed',
  modeCode: 'idle',
  startsAt: null,
  durationSeconds: 3600,
  meanWatts: 8,
  minimumWatts: null,
  maximumWatts: null,
  energyWattHours: null,
  uses: null,
  note: '',
} as const;

/** The kinds of warning that a report gets which would get none, but for what is changed. */
function kinds({
  figure = {},
  phase = {},
  peers = {},
  instrument = {},
  sameFiles = [],
}: {
  figure?: Partial<typeof FIGURE>;
  phase?: Partial<Record<keyof typeof PHASE, unknown>>;
  peers?: Partial<DeskFacts['peers'][number]>;
  instrument?: Partial<Report['instrument']>;
  sameFiles?: DeskFacts['sameFiles'];
} = {}): string[] {
  const report = {
    figures: [{ ...FIGURE, ...figure }],
    content: { phases: [{ ...PHASE, ...phase }] },
    instrument: { lowerLimitWatts: 0.5, readsTruePower: true, ...instrument },
    method: { minimumSeconds: 600 },
  } as unknown as Report;
  const known = [{ figureId: 1, values: [], categoryMedian: null, ...peers }];
  return findWarnings({ report, peers: known, sameFiles }).map((warning) => warning.kind);
}

describe('the warnings of the desk', () => {
  it('are none for a report that agrees with itself and the others', () => {
    expect(kinds()).toEqual([]);
    expect(kinds({ peers: { values: [7.5, 8.2, 8.4, 7.9, 8.1], categoryMedian: 9 } })).toEqual([]);
  });

  it('see a value outside the device’s spread: by its z-score from five, by a factor of two below', () => {
    expect(kinds({ figure: { value: 14 }, peers: { values: [7.5, 8.2, 8.4, 7.9, 8.1] } })).toEqual(['outside-spread']);
    expect(kinds({ figure: { value: 14 }, peers: { values: [8] } })).toEqual([]);
    expect(kinds({ figure: { value: 17 }, peers: { values: [8] } })).toEqual(['outside-spread']);
  });

  it('see a unit slip of a thousand, either way, also against the category alone', () => {
    expect(kinds({ figure: { value: 8000 }, peers: { values: [8] } })).toEqual(['unit-slip']);
    expect(kinds({ figure: { value: 0.8, standardUncertainty: 0.01 }, peers: { categoryMedian: 800 } })).toEqual([
      'unit-slip',
    ]);
  });

  it('see what lies below the instrument’s floor', () => {
    expect(kinds({ figure: { value: 0.3, standardUncertainty: 0.01 } })).toEqual(['below-limit']);
    expect(kinds({ figure: { value: 0.3, censoredAt: 0.5 } })).toEqual(['below-limit']);
  });

  it('see an uncertainty above a fifth, watts without true power, and a recording that is too short', () => {
    expect(kinds({ figure: { standardUncertainty: 0.81 } })).toEqual(['wide-uncertainty']);
    expect(kinds({ instrument: { readsTruePower: false } })).toEqual(['apparent-only']);
    expect(kinds({ phase: { durationSeconds: 599 } })).toEqual(['too-short']);
  });

  it('hold energy against power and time', () => {
    expect(kinds({ phase: { energyWattHours: 8.1 } })).toEqual([]);
    expect(kinds({ phase: { energyWattHours: 8.3 } })).toEqual(['energy-and-power']);
  });

  it('see a file that stands in another report', () => {
    const sameFiles = [{ kind: 'trace', index: 0, reportPublicId: 'abcdefghij', isSameMember: false }] as const;
    expect(kinds({ sameFiles: [...sameFiles] })).toEqual(['same-file']);
  });
});
