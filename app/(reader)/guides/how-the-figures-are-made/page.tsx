import type { Metadata } from 'next';
import { Crumbs, PageTitle, Section } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { RULE_VERSION } from '@/lib/measurement/rule-version';
import { formatFigure } from '@/lib/measurement/units/format-figure';
import { meterReading, thermostat, unevenTrace } from './_components/examples';
import { PublishedRules } from './_components/published-rules';
import { Rule } from './_components/rule';

export const metadata: Metadata = {
  title: 'How the figures are made',
  description: 'Each rule in plain words, with one worked example that the site’s own code computes.',
  alternates: { canonical: '/guides/how-the-figures-are-made' },
};

const w = (value: number, decimals = 1) => `${value.toFixed(decimals)} W`;

export default function HowTheFiguresAreMadePage() {
  const uneven = unevenTrace();
  const cycles = thermostat();
  const meter = meterReading();
  return (
    <Sheet
      head={
        <>
          <Crumbs trail={[{ name: 'Guides', href: '/guides' }]} />
          <PageTitle
            lead={`Each rule in plain words, with an example whose numbers this page’s own code has just worked out. Rules, version ${RULE_VERSION}.`}
          >
            How the figures are made
          </PageTitle>
        </>
      }
    >
      <Section title="From readings to power">
        <Rule
          title="Time weighs, rows don’t"
          example={`${uneven.rows} rows: ten seconds at 100 W, a row a second, then ten minutes at 10 W, a row a minute. The mean of the rows is ${w(uneven.plainMean)}; the mean over time is ${w(uneven.weightedMean)}.`}
        >
          A logger that writes more often while something happens would count it twice. The mean is energy over counted
          time, always. A gap counts neither its time nor its energy, and the coverage says how much is left.
        </Rule>
        {cycles && (
          <Rule
            title="A thermostat’s day comes from whole cycles"
            example={`Twelve hours, 20 minutes at 80 W and 40 at 2 W in each: ${cycles.cycles.length} whole cycles, on for ${Math.round(cycles.dutyCycle * 100)} % of the time, ${w(cycles.meanWatts)} on average, ${Math.round(cycles.dayWattHours)} Wh a day.`}
          >
            Cut anywhere, a recording holds too much running or too much rest. So a cycle is counted from one
            switching-on to the next, three at least, and what is left over at both ends is not. Without three there is
            no energy of a day, and the report says why.
          </Rule>
        )}
      </Section>
      <Section title="How sure a reading is">
        <Rule
          title="What the manual states, and what varied"
          example={`A meter of ±(1 % + 1 count of 0.1 W) shows 43.2 W: a half-width of ${w(meter.halfWidth, 2)}, so a standard uncertainty of ${w(meter.halfWidth / Math.sqrt(3), 2)}. With readings that repeat to 0.25 W together ${w(meter.standard, 2)}, written ${formatFigure({ value: meter.watts, standardUncertainty: meter.standard, unit: 'W' }).text}.`}
        >
          The stated accuracy is a half-width in which every value is as likely; divided by the square root of three it
          is a standard uncertainty. What varied, the display’s step, and the shortness of a recording are added by the
          root of the sum of squares. What is written is twice the result (k = 2).
        </Rule>
      </Section>
      <PublishedRules />
    </Sheet>
  );
}
