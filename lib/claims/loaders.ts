import 'server-only';
import { unstable_cache } from 'next/cache';
import { cache } from 'react';
import { claimsOfDevice } from './queries';
import type { Claim } from './schema';

export const loadClaimsOfDevice = cache((deviceId: number): Promise<Claim[]> => {
  const load = unstable_cache(claimsOfDevice, ['claims-of-device', String(deviceId)], {
    tags: [`device:${deviceId}`],
    revalidate: false,
  });
  return load(deviceId);
});
