import type { Basis, Variant } from './schema';

const UNITS = { 'mean-power': 'W', 'day-energy': 'Wh/d', 'use-energy': 'Wh/use' } as const;

/** What two devices of a category are compared by, with its unit and the words a reader sees. */
export function describeBasis(quantity: Basis['quantity'], mode: { code: string; name: string } | null): Basis {
  const label =
    quantity === 'day-energy'
      ? 'energy of a day'
      : quantity === 'use-energy'
        ? 'energy of a use'
        : `power when ${mode?.name.toLowerCase() ?? 'on'}`;
  return { quantity, modeCode: mode?.code ?? null, unit: UNITS[quantity], label };
}

/** "second generation, EU". */
export function variantLabel(variant: Pick<Variant, 'generation' | 'region'>): string {
  return [variant.generation, variant.region].filter(Boolean).join(', ');
}

const RESERVED = new Set(['new', 'edit', 'admin', 'api', 'search', 'compare', 'all', 'none']);

/**
 * An address part from a name: letters without accents, digits and single hyphens, at most 80 characters. A name with
 * nothing that can be kept (emoji alone) becomes "device" and gets a number from whoever makes it unique.
 */
export function slugFrom(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/\p{Mark}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, 80)
    .replace(/^-+|-+$/g, '');
  if (plain === '') return 'device';
  return RESERVED.has(plain) ? `${plain}-device` : plain;
}
