import type { Load } from './load';
import type { Random } from './random';

export interface NetworkModel {
  bootWatts: number;
  bootSeconds: number;
  idleWatts: number;
  busyWatts: number;
  /** Seconds off before it is switched on, at the start of the log. */
  offSeconds: number;
  /** Hours of the day in which downloads run. */
  busyHours: [number, number];
}

/** A router: off, a boot that spins up radios one after the other, then idle with clients that come and go. */
export function simulateNetwork(model: NetworkModel, seconds: number, startHour: number, random: Random): Load {
  const watts = new Float64Array(seconds);
  let wander = 0;
  for (let t = 0; t < seconds; t += 1) {
    if (t < model.offSeconds) continue;
    const since = t - model.offSeconds;
    const hour = (startHour + t / 3600) % 24;
    const busy = hour >= model.busyHours[0] && hour < model.busyHours[1];
    // Clients come and go: a slow wander that always returns.
    wander = 0.999 * wander + random.normal(0, 0.006);
    if (since < model.bootSeconds) {
      const stage = Math.floor((since / model.bootSeconds) * 4);
      watts[t] = model.bootWatts * (0.72 + 0.1 * stage) + random.normal(0, 0.35);
    } else if (busy) {
      watts[t] = model.busyWatts + random.normal(0, 0.3);
    } else {
      watts[t] = model.idleWatts + wander + random.normal(0, 0.08) + (random.uniform() < 0.004 ? 0.9 : 0);
    }
  }
  return { watts };
}
