import { describe, expect, it } from 'vitest';
import { checkContent } from '@/lib/reports/rules/check-content';
import { exchangedModes } from '@/lib/reports/rules/check-modes';
import type { Computation, ReportFigureDraft } from '@/lib/reports/rules/compute-figures';
import { whatIsMissing } from '@/lib/reports/rules/what-is-missing';
import { aContent, typedPhase } from '../../factories/reports';

const now = new Date('2026-11-03T12:00:00Z');
const around = { now, modeCodes: new Set(['idle', 'busy']), conditionKeys: new Set(['clients']), traces: new Map() };
const pointers = (traits: Parameters<typeof aContent>[1]) =>
  checkContent(aContent('plug-in-steady', traits), around).map((problem) => problem.pointer);

describe('a content', () => {
  it('that agrees with its surroundings has no problem', () => {
    expect(pointers({ conditions: { clients: '6' } })).toEqual([]);
  });

  it.each([
    ['2026-11-03', []],
    ['2026-11-04', []],
    ['2026-11-05', ['/content/measuredOn']],
  ])(
    'measured on %s at noon of the 3rd in UTC: tomorrow it may be already, the day after nowhere',
    (measuredOn, found) => {
      expect(pointers({ measuredOn })).toEqual(found);
    },
  );

  it.each([
    ['2026-11-03T11:05:00Z', []],
    ['2026-11-03T12:05:00+01:00', []],
    ['2026-11-03T11:15:00Z', ['/content/phases/0/startsAt']],
  ])('with an hour’s phase from %s: a clock may be ten minutes fast', (startsAt, found) => {
    expect(pointers({ phases: [typedPhase('idle', 8, { startsAt })] })).toEqual(found);
  });
});

const figure = (
  modeCode: string | null,
  value: number,
  traits: Partial<ReportFigureDraft> = {},
): ReportFigureDraft => ({
  modeCode,
  quantity: 'mean-power',
  powerKind: 'real',
  value,
  standardUncertainty: 0.1,
  parts: { gain: 0, offset: 0, resolution: 0, repeatability: 0, drift: 0, belowLimit: 0 },
  censoredAt: null,
  averagingSeconds: 600,
  coverage: 1,
  countedSeconds: 600,
  ...traits,
});

describe('modes that were exchanged', () => {
  it('are those where rest draws clearly more than work', () => {
    expect(exchangedModes([figure('idle', 20), figure('busy', 9)])).toEqual([{ rest: 'idle', work: 'busy' }]);
  });

  it.each([
    ['rest draws less', [figure('idle', 8), figure('busy', 9)]],
    ['both draw the same, give or take', [figure('idle', 9.4), figure('busy', 9)]],
    ['rest lies below what the instrument sees', [figure('standby', 3, { censoredAt: 3 }), figure('busy', 1)]],
    ['one is apparent power', [figure('idle', 20, { powerKind: 'apparent' }), figure('busy', 9)]],
    ['one is an energy', [figure('idle', 20), figure('busy', 9, { quantity: 'use-energy' })]],
    ['there is nothing to compare', []],
  ])('are none where %s', (_what, figures) => expect(exchangedModes(figures)).toEqual([]));
});

describe('what a report lacks of its method', () => {
  const nameOf = (code: string) => `Mode ${code}`;
  const computed = (figures: ReportFigureDraft[], wholeCycles: number | null = null): Computation => ({
    figures,
    refusals: [],
    wholeCycles,
  });

  it('is nothing where the minimum is reached', () => {
    const method = { minimumSeconds: 600, minimumCycles: 3 };
    expect(whatIsMissing(method, computed([figure('idle', 8)], 3), 600, nameOf)).toEqual([]);
  });

  it('is told mode by mode for a method of minutes, but not of a start-up', () => {
    const method = { minimumSeconds: 600, minimumCycles: 0 };
    const figures = [figure('idle', 8, { countedSeconds: 420 }), figure('boot', 12, { countedSeconds: 95 })];
    expect(whatIsMissing(method, computed(figures), 515, nameOf)).toEqual([
      'Mode idle: the method asks for 10 minutes; 7 minutes are there.',
    ]);
  });

  it('is told of the whole recording for a method of hours', () => {
    const method = { minimumSeconds: 86_400, minimumCycles: 0 };
    expect(whatIsMissing(method, computed([figure('idle', 8)]), 80_000, nameOf)).toEqual([
      'The method asks for 24 hours; 22.2 hours are there.',
    ]);
  });

  it('names gaps from a tenth of the time on', () => {
    const method = { minimumSeconds: 0, minimumCycles: 0 };
    const missing = (coverage: number) =>
      whatIsMissing(method, computed([figure('idle', 8, { coverage })]), 600, nameOf);
    expect(missing(0.9)).toEqual([]);
    expect(missing(0.899)).toEqual(['Mode idle: only 89 % of the time counts, the rest are gaps.']);
  });
});
