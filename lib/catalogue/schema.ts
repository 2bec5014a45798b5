import { z } from 'zod';

/** A condition that reports of a category record, as its form asks for it. */
export const conditionField = z.object({
  key: z.string().regex(/^[a-z]+(-[a-z]+)*$/),
  label: z.string(),
  unit: z.string().nullable(),
  hint: z.string(),
});

/** How long a device stands in each mode on an ordinary day, and how often it is used. Hours sum to at most 24. */
export const usePattern = z.object({
  hoursByMode: z.record(z.string(), z.number().min(0).max(24)),
  usesPerDay: z.number().min(0).nullable(),
});

export const operatingMode = z.object({
  id: z.number().int(),
  code: z.string(),
  name: z.string(),
  definition: z.string(),
  note: z.string(),
});

export const basis = z.object({
  quantity: z.enum(['mean-power', 'day-energy', 'use-energy']),
  modeCode: z.string().nullable(),
  /** W, Wh/d or Wh/use. */
  unit: z.string(),
  /** "energy of a day", "power when idle". */
  label: z.string(),
});

export const category = z.object({
  id: z.number().int(),
  publicId: z.string(),
  revisionId: z.number().int(),
  slug: z.string(),
  name: z.string(),
  parent: z.object({ name: z.string(), slug: z.string() }).nullable(),
  summary: z.string(),
  duty: z.enum(['continuous', 'cyclic', 'per-use', 'modulating']),
  basis,
  modes: z.array(operatingMode),
  poolsVariants: z.boolean(),
  poolsSupplies: z.boolean(),
  unitSpread: z.number(),
  mayBeSwitchedOff: z.boolean(),
  usePattern,
  conditions: z.array(conditionField),
  cautions: z.array(z.string()),
});

export const variant = z.object({
  publicLabel: z.string(),
  id: z.number().int(),
  generation: z.string(),
  region: z.string().nullable(),
  ratedWatts: z.number().nullable(),
  ratedSupply: z.string().nullable(),
});

export const device = z.object({
  id: z.number().int(),
  publicId: z.string(),
  slug: z.string(),
  name: z.string(),
  maker: z.string(),
  model: z.string(),
  state: z.enum(['new', 'confirmed', 'merged', 'refused']),
  category: z.object({ id: z.number().int(), name: z.string(), slug: z.string() }),
  aliases: z.array(z.string()),
  variants: z.array(variant),
});

/** A device as the API names it: no inner ids. */
export const publicDevice = device.omit({ id: true }).extend({
  category: device.shape.category.omit({ id: true }),
  variants: z.array(variant.omit({ id: true })),
});

const shortText = (what: string, most: number) =>
  z.string().trim().min(1, `Say ${what}.`).max(most, `Shorten this to ${most} characters.`);

/** A device that a member proposes; it goes live marked as new. */
export const proposedDevice = z.object({
  maker: shortText('who makes it, as the rating plate says', 80),
  model: shortText('the model, as the rating plate says', 80),
  categoryPublicId: z.string(),
  generation: z.string().trim().max(60, 'Shorten this to 60 characters.').optional(),
  ratedWatts: z.number().positive('Give the rated watts as a number above 0, or leave it empty.').optional(),
});

export type Basis = z.infer<typeof basis>;
export type Category = z.infer<typeof category>;
export type ConditionField = z.infer<typeof conditionField>;
export type Device = z.infer<typeof device>;
export type OperatingMode = z.infer<typeof operatingMode>;
export type ProposedDevice = z.infer<typeof proposedDevice>;
export type UsePattern = z.infer<typeof usePattern>;
export type Variant = z.infer<typeof variant>;
