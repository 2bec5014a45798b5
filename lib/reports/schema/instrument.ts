import { z } from 'zod';
import { finite, keys, publicId, SUPPLY_CLASSES, text } from './content';

export const INSTRUMENT_KINDS = {
  'plug-in-meter': 'plug-in meter',
  'metering-breaker': 'metering breaker',
  clamp: 'clamp',
  'dc-shunt': 'DC shunt',
  'inverter-log': 'inverter’s log',
  'bench-analyser': 'bench power analyser',
} as const;

const share = (what: string) => finite.min(0, `${what} can’t be negative.`).max(100, `${what} is at most 100.`);

/** An instrument with its stated accuracy: ±(a % of reading + b % of range + c counts). */
export const instrumentInput = z
  .object({
    name: text(80).min(1, 'Give it a name that you will know it by.'),
    kind: z.enum(keys(INSTRUMENT_KINDS), 'Choose the kind of instrument.'),
    modelName: text(80).min(1, 'Give the kind of model, as its manual says.'),
    percentOfReading: share('The share of the reading'),
    percentOfRange: share('The share of the range'),
    rangeWatts: finite.positive('Give the full scale in watts, above 0.').nullable(),
    counts: finite.min(0, 'Counts can’t be negative.').max(1000, 'At most 1,000 counts.'),
    resolutionWatts: finite.positive('Give the smallest step of the display in watts, for example 0.1.'),
    resolutionWattHours: finite.positive('Give the step of the energy counter in Wh, or leave it empty.').nullable(),
    lowerLimitWatts: finite.min(0, 'The lower limit can’t be negative.').nullable(),
    readsTruePower: z.boolean('Say whether it reads true power.'),
    supplies: z.array(z.enum(keys(SUPPLY_CLASSES))).min(1, 'Choose at least one supply that it measures.'),
    averagingSeconds: finite.positive('Give seconds above 0, or leave it empty.').nullable(),
    calibratedOn: z.iso.date('Give the day, or leave it empty.').nullable(),
  })
  .refine((given) => given.percentOfRange === 0 || given.rangeWatts !== null, {
    path: ['rangeWatts'],
    message: 'A share of the range needs the range: give the full scale in watts.',
  });

/** An instrument as its owner and a moderator see it. */
export const instrument = instrumentInput.extend({ publicId, revision: z.int() });

export type InstrumentInput = z.infer<typeof instrumentInput>;
export type Instrument = z.infer<typeof instrument>;
