import { z } from 'zod';

export const CLAIM_KINDS = [
  'typical',
  'maximum',
  'standby',
  'networked-standby',
  'annual-energy',
  'use-energy',
] as const;

export const CLAIM_KIND_WORDS: Record<(typeof CLAIM_KINDS)[number], string> = {
  typical: 'typical power',
  maximum: 'maximum power',
  standby: 'standby power',
  'networked-standby': 'networked standby power',
  'annual-energy': 'energy of a year',
  'use-energy': 'energy of a use',
};

/** What a maker states of a device, in the revision that is in force. */
export const claim = z.object({
  publicId: z.string(),
  revision: z.number().int(),
  variant: z.object({ id: z.number().int(), label: z.string() }).nullable(),
  state: z.enum(['in-force', 'disputed', 'superseded']),
  kind: z.enum(CLAIM_KINDS),
  lower: z.number().nullable(),
  upper: z.number().nullable(),
  singleValue: z.boolean(),
  /** The place of the last printed digit of a single value: 0.1 for "4.5". */
  lastDigit: z.number().nullable(),
  tolerancePercent: z.number().nullable(),
  unit: z.enum(['W', 'VA', 'kWh/a', 'Wh/d', 'Wh/use']),
  usesPerYear: z.number().nullable(),
  /** The maker's own word for it, and how the maker defines that. */
  term: z.string(),
  definition: z.string().nullable(),
  /** The operating mode it is taken to mean, and why. */
  mode: z.object({ code: z.string(), name: z.string() }).nullable(),
  modeReason: z.string().nullable(),
  /** Why the maker's definition contradicts that mode; a claim with this is not comparable. */
  contradictsMode: z.string().nullable(),
  ambientCelsius: z.number().nullable(),
  source: z.object({
    title: z.string(),
    address: z.string().nullable(),
    page: z.string().nullable(),
    readOn: z.string(),
  }),
});

export type Claim = z.infer<typeof claim>;
