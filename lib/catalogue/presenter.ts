import type { z } from 'zod';
import type { Device, publicDevice } from './schema';

/** A device as the API shows it: named fields only, no inner ids. */
export function presentDevice(device: Device): z.infer<typeof publicDevice> {
  return {
    publicId: device.publicId,
    slug: device.slug,
    name: device.name,
    maker: device.maker,
    model: device.model,
    state: device.state,
    category: { name: device.category.name, slug: device.category.slug },
    aliases: device.aliases,
    variants: device.variants.map((variant) => ({
      publicLabel: variant.publicLabel,
      generation: variant.generation,
      region: variant.region,
      ratedWatts: variant.ratedWatts,
      ratedSupply: variant.ratedSupply,
    })),
  };
}
