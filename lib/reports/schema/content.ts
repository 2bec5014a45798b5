import { z } from 'zod';
import { proposedDevice } from '@/lib/catalogue/schema';

const NUMBER = 'Give a number.';
export const finite = z.number(NUMBER);
const time = z.iso.datetime({ offset: true, message: 'Give a date and a time.' });
export const publicId = z.string().regex(/^[a-z0-9]{10}$/, 'Choose one from the list.');
/** A megawatt: no household has a device that draws more, so a larger number is another unit. */
const watts = finite
  .min(-1e6, 'Check the unit: that is under −1,000 kW.')
  .max(1e6, 'Check the unit: that is over 1,000 kW.');
export const text = (most: number) => z.string().trim().max(most, `Shorten this to ${most} characters.`);

export const MEASURING_POINTS = {
  plug: 'at the plug',
  circuit: 'in its circuit',
  'battery-side': 'on the battery side of the inverter',
  'device-side': 'on the device side, DC',
  'behind-adapter': 'behind its adapter',
} as const;

export const SUPPLY_CLASSES = { 'ac-230': 'mains 230 V', 'ac-120': 'mains 120 V', dc: 'DC' } as const;

export const PHOTO_KINDS = {
  display: 'instrument’s display',
  'set-up': 'set-up',
  'rating-plate': 'rating plate',
} as const;

export const keys = <T extends string>(of: Record<T, string>) => Object.keys(of) as [T, ...T[]];

const uses = z.int('Give a whole number.').min(1, 'At least one use.').max(10_000, 'At most 10,000 uses.').nullable();

/** A stretch whose figures were read off a display. */
export const typedPhase = z
  .object({
    source: z.literal('typed'),
    modeCode: z.string().min(1, 'Choose the operating mode.'),
    startsAt: time.nullable(),
    durationSeconds: finite.positive('Say how long it lasted.').max(366 * 86_400, 'A year is the longest.'),
    meanWatts: watts.nullable(),
    minimumWatts: watts.nullable(),
    maximumWatts: watts.nullable(),
    energyWattHours: finite
      .min(0, 'An energy can’t be negative.')
      .max(1e9, 'Check the unit: that is over 1,000,000 kWh.')
      .nullable(),
    uses,
    note: text(500),
  })
  .superRefine((phase, context) => {
    const problem = (path: string, message: string) => context.addIssue({ code: 'custom', path: [path], message });
    const { meanWatts: mean, minimumWatts: low, maximumWatts: high, energyWattHours: energy } = phase;
    if (mean === null && energy === null) problem('meanWatts', 'Give the mean power, the energy, or both.');
    if (low !== null && high !== null && low > high) problem('minimumWatts', 'The minimum is above the maximum.');
    if (mean !== null && low !== null && mean < low) problem('meanWatts', 'The mean is below the minimum.');
    if (mean !== null && high !== null && mean > high) problem('meanWatts', 'The mean is above the maximum.');
    if (mean !== null && energy !== null && Math.abs(mean) > 0.5) {
      const expected = (mean * phase.durationSeconds) / 3600;
      if (Math.abs(energy - expected) > 0.05 * Math.abs(expected) + 1) {
        const words = `${mean} W over that time is ${expected.toPrecision(3)} Wh`;
        problem('energyWattHours', `Mean power and energy disagree: ${words}. Check unit and duration.`);
      }
    }
  });

/** A stretch of a trace in one operating mode. */
export const tracedPhase = z
  .object({
    source: z.literal('trace'),
    modeCode: z.string().min(1, 'Choose the operating mode.'),
    tracePublicId: publicId,
    fromSeconds: finite,
    toSeconds: finite,
    uses,
    note: text(500),
  })
  .refine((phase) => phase.toSeconds > phase.fromSeconds, {
    path: ['toSeconds'],
    message: 'The end lies before the start. Move one of the edges.',
  });

export const phase = z.discriminatedUnion('source', [typedPhase, tracedPhase]);

export const photoReference = z.object({
  publicId,
  kind: z.enum(keys(PHOTO_KINDS)),
  caption: text(300),
});

/** How the device was fed and where the instrument sat. */
export const supply = {
  supplyClass: z.enum(keys(SUPPLY_CLASSES), 'Choose the supply.'),
  supplyVolts: finite.positive('Give the volts, above 0.').max(1000, 'At most 1,000 V.').nullable(),
  hertz: finite.positive('Give the hertz, above 0.').max(1000, 'At most 1,000 Hz.').nullable(),
  measuringPoint: z.enum(keys(MEASURING_POINTS), 'Choose where it was measured.'),
  isOnlyLoad: z.boolean('Say whether it was the only load there.'),
  ambientCelsius: finite.min(-60, 'Below −60 °C is too cold to be true.').max(80, 'Above 80 °C is too hot.').nullable(),
};

/** What a report says, complete: the content of a revision. */
export const reportContent = z.object({
  variantLabel: text(130).nullable(),
  unitLabel: text(120).nullable(),
  methodCode: z.string().min(1, 'Choose the method.'),
  cautionConfirmed: z.boolean(),
  ...supply,
  conditions: z.record(z.string().max(60), text(300)),
  heldConstant: text(1000),
  measuredOn: z.iso.date('Give the day on which the measurement began.'),
  phases: z.array(phase).min(1, 'Add at least one phase.').max(200, 'At most 200 phases.'),
  traces: z.array(publicId).max(20, 'At most 20 traces.'),
  photos: z.array(photoReference).max(20, 'At most 20 photos.'),
  notes: text(20_000),
});

/** Where the device comes from: the catalogue, or a proposal that goes live marked as new. */
export const deviceChoice = z.discriminatedUnion('from', [
  z.object({
    from: z.literal('catalogue'),
    publicId,
    variantId: z
      .int()
      .positive()
      .max(2 ** 31 - 1)
      .nullable(),
  }),
  z.object({ from: z.literal('proposal'), proposal: proposedDevice }),
]);

/** What is sent for review: a complete report with its device and instrument. */
export const submission = z.object({
  device: deviceChoice,
  instrumentPublicId: publicId,
  content: reportContent,
  licenceAgreed: z.literal(true, 'Agree to the licence, or the report can’t be published.'),
});

/** A draft holds whatever was typed so far, as it was typed: only its size is limited. */
export const draftContent = z
  .record(z.string().max(60), z.unknown())
  .refine(
    (content) => JSON.stringify(content).length <= 400_000,
    'This draft is longer than 400,000 characters. Shorten the notes or split the report.',
  );

export const REPORT_STATES = [
  'draft',
  'submitted',
  'second-review',
  'changes-requested',
  'verified',
  'declined',
  'withdrawn',
  'lapsed',
] as const;

export const STATE_WORDS: Record<(typeof REPORT_STATES)[number], string> = {
  draft: 'draft',
  submitted: 'waiting for review',
  'second-review': 'waiting for a second review',
  'changes-requested': 'changes requested',
  verified: 'verified',
  declined: 'declined',
  withdrawn: 'withdrawn',
  lapsed: 'lapsed',
};

/** One item of a method's checklist. */
export const checklistItem = z.object({ key: z.string(), label: z.string(), hint: z.string() });

export const SCHEMA_VERSION = 1;

export type DeviceChoice = z.infer<typeof deviceChoice>;
export type Phase = z.infer<typeof phase>;
export type PhotoReference = z.infer<typeof photoReference>;
export type ReportContent = z.infer<typeof reportContent>;
export type ReportState = (typeof REPORT_STATES)[number];
export type Submission = z.infer<typeof submission>;
export type ChecklistItem = z.infer<typeof checklistItem>;
