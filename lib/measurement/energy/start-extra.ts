/**
 * What a start-up costs: its energy beyond what the mode after it would have drawn in that time.
 *
 * Check: common practice, no source.
 * @param startWattHours the start-up's whole energy.
 * @param seconds how long it lasts.
 * @param followingWatts mean power of the mode that follows.
 * @returns Wh; negative where the start-up draws less than what follows.
 * @example startExtraEnergy(70 / 6, 600, 43) // 4.5
 */
export function startExtraEnergy(startWattHours: number, seconds: number, followingWatts: number): number {
  return startWattHours - (followingWatts * seconds) / 3600;
}
