import { Section } from '@/components/layout/headings';
import { OUTCOME_WORDS } from '@/lib/measurement/claims/outcome-words';
import { formatFigure, formatRange } from '@/lib/measurement/units/format-figure';
import { besideClaim, oneVoice } from './examples';
import { Rule } from './rule';

const w = (value: number, decimals = 1) => `${value.toFixed(decimals)} W`;

/** From reports to a published figure, and that figure beside a claim. */
export function PublishedRules() {
  const { before, after } = oneVoice();
  const beside = besideClaim();
  return (
    <>
      <Section title="From reports to a published figure">
        {before && after && (
          <>
            <Rule
              title="One household, one voice"
              example={`Six contributors found 41 to 46 W: the median is ${w(before.median)}. The first of them sends nine further reports of 60 W: they are still one voice, and the median is ${w(after.median)}.`}
            >
              A contributor’s reports of a device count as their median. Accounts of one household, and two members who
              measured the very same unit, are one voice too.
            </Rule>
            <Rule
              title="Median, range, interval"
              example={`Of those six: median ${w(before.median)}, range ${formatRange(before.minimum, before.maximum, 'W')}, quartiles ${formatRange(before.lowerQuartile ?? 0, before.upperQuartile ?? 0, 'W')}, and the median lies between ${w(before.interval?.low ?? 0, 0)} and ${w(before.interval?.high ?? 0, 0)} with a probability of ${((before.interval?.coverage ?? 0) * 100).toFixed(1)} %.`}
            >
              The range is always published, quartiles from four voices, and from six an interval for the median that
              assumes nothing about how the values are spread: it counts ranks.
            </Rule>
          </>
        )}
      </Section>
      {beside && (
        <Section title="Beside the maker’s claim">
          <Rule
            title="A probability decides"
            example={`Those six, ${formatFigure({ value: beside.published.median, standardUncertainty: beside.published.standardUncertainty, unit: 'W' }).text}, beside “60 to 75 W”: below with a probability of ${(beside.comparison.probability?.below ?? 0).toFixed(3)}, so ${OUTCOME_WORDS[beside.comparison.outcome]}.`}
          >
            The outcome is the one whose probability is at least 0.95, by Student’s t; otherwise it is too close to
            call. A single value means ±10 % unless the maker states a tolerance. A maximum can only be exceeded, or not
            exceeded in what was measured.
          </Rule>
        </Section>
      )}
    </>
  );
}
