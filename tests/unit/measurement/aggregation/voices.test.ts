import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { latestRevisions } from '@/lib/measurement/aggregation/latest-revisions';
import type { VerifiedFigure } from '@/lib/measurement/aggregation/types';
import { byText, groupVoices } from '@/lib/measurement/aggregation/voices';
import { figure } from './figures';

/** The voices as lists of figure ids, by spreading one label between neighbours until nothing changes. */
function bruteVoices(figures: readonly VerifiedFigure[]): string[] {
  const labels = figures.map((_, i) => i);
  const tied = (a: VerifiedFigure, b: VerifiedFigure) =>
    a.contributorId === b.contributorId ||
    (a.householdId !== null && a.householdId === b.householdId) ||
    (a.unitId !== null && a.unitId === b.unitId);
  for (let round = 0; round < figures.length; round += 1) {
    figures.forEach((a, i) =>
      figures.forEach((b, j) => {
        if (tied(a, b)) labels[i] = labels[j] = Math.min(labels[i] as number, labels[j] as number);
      }),
    );
  }
  return [...new Set(labels)].map((label) => idsOf(figures.filter((_, i) => labels[i] === label))).sort();
}

function idsOf(figures: readonly VerifiedFigure[]): string {
  return figures
    .map((item) => item.figureId)
    .sort()
    .join(' ');
}

describe('one voice', () => {
  it('is one contributor’s, however many reports', () => {
    const voices = groupVoices([
      figure({ contributorId: 'ina' }),
      figure({ contributorId: 'orla' }),
      figure({ contributorId: 'ina' }),
    ]);
    expect(voices.map((voice) => [voice.voiceId, voice.figures.length])).toEqual([
      ['ina', 2],
      ['orla', 1],
    ]);
  });

  it('is that of the accounts of one household, named after the first in text order', () => {
    const voices = groupVoices([
      figure({ contributorId: 'orla', householdId: 'north-cottage' }),
      figure({ contributorId: 'ina', householdId: 'north-cottage' }),
      figure({ contributorId: 'tam', householdId: 'mill' }),
    ]);
    expect(voices.map((voice) => [voice.voiceId, voice.figures.length])).toEqual([
      ['ina', 2],
      ['tam', 1],
    ]);
  });

  it('is that of one physical unit measured by two members', () => {
    expect(
      groupVoices([figure({ contributorId: 'ina', unitId: '7' }), figure({ contributorId: 'orla', unitId: '7' })]),
    ).toHaveLength(1);
  });

  it('joins through one another: a unit ties two members, a household ties a third', () => {
    expect(
      groupVoices([
        figure({ contributorId: 'ina', unitId: '7' }),
        figure({ contributorId: 'tam', householdId: 'mill' }),
        figure({ contributorId: 'orla', unitId: '7', householdId: 'mill' }),
      ]),
    ).toHaveLength(1);
  });

  it('does not join a household, a unit and a member of the same id, nor those without', () => {
    expect(
      groupVoices([
        figure({ contributorId: '1', householdId: '2', unitId: '3' }),
        figure({ contributorId: '2', householdId: '3', unitId: '1' }),
        figure({ contributorId: '3', householdId: null, unitId: null }),
        figure({ contributorId: '4', householdId: null, unitId: null }),
      ]),
    ).toHaveLength(4);
  });

  it('is none of no figures', () => {
    expect(groupVoices([])).toEqual([]);
  });

  it('is what spreading labels between tied figures gives, in any order of the figures', () => {
    const traits = fc.record({
      contributorId: fc.constantFrom('a', 'b', 'c', 'd', 'e', 'f'),
      householdId: fc.option(fc.constantFrom('x', 'y', 'z'), { freq: 1 }),
      unitId: fc.option(fc.constantFrom('1', '2', '3', '4'), { freq: 1 }),
    });
    fc.assert(
      fc.property(fc.array(traits, { maxLength: 12 }), (list) => {
        const input = list.map((item) => figure(item));
        const voices = groupVoices(input);
        expect(voices.map((voice) => idsOf(voice.figures)).sort()).toEqual(bruteVoices(input));
        expect(groupVoices([...input].reverse())).toEqual(voices);
        expect(voices.map((voice) => voice.voiceId)).toEqual(voices.map((voice) => voice.voiceId).sort(byText));
      }),
    );
  });
});

describe('text in order', () => {
  it('goes by code units', () => {
    expect(['b', 'a', 'B', 'a'].sort(byText)).toEqual(['B', 'a', 'a', 'b']);
    expect(byText('a', 'a')).toBe(0);
  });
});

describe('the latest revision of a report', () => {
  it('speaks for it: "10" comes after "9", whatever the order of the figures', () => {
    const earlier = figure({ reportId: 'r', revisionId: '9' });
    const later = figure({ reportId: 'r', revisionId: '10' });
    for (const input of [
      [earlier, later],
      [later, earlier],
    ]) {
      expect(latestRevisions(input)).toEqual({ latest: [later], replaced: [earlier] });
    }
  });

  it('is told by the digits where the lengths agree', () => {
    const revisions = ['11', '13', '12'].map((revisionId) => figure({ reportId: 'r', revisionId }));
    expect(latestRevisions(revisions).latest).toEqual([revisions[1]]);
  });

  it('keeps all its figures, and leaves other reports alone', () => {
    const both = [figure({ reportId: 'r', revisionId: '9' }), figure({ reportId: 'r', revisionId: '9' })];
    const other = figure({ reportId: 's', revisionId: '2' });
    expect(latestRevisions([...both, other])).toEqual({ latest: [...both, other], replaced: [] });
    expect(latestRevisions([])).toEqual({ latest: [], replaced: [] });
  });
});
