import type { Load } from './load';
import type { Random } from './random';

export interface WashModel {
  heaterWatts: number;
  drumWatts: number;
  spinWatts: number;
  leftOnWatts: number;
  /** Litres that the heater warms, and from and to which temperature. */
  litres: number;
  inletCelsius: number;
  washCelsius: number;
}

const WATER_J_PER_LITRE_KELVIN = 4186;

/** One programme at 40 °C: fill, heat by its own thermostat, wash with a turning drum, rinse, spin, and then left on. */
export function simulateWash(model: WashModel, leadSeconds: number, tailSeconds: number, random: Random): Load {
  const watts: number[] = [];
  const put = (seconds: number, level: (t: number) => number) => {
    for (let t = 0; t < seconds; t += 1) watts.push(Math.max(0, level(t)));
  };
  // The drum turns twelve seconds and rests six.
  const drum = (t: number) => (t % 18 < 12 ? random.normal(model.drumWatts, 9) : random.normal(4, 0.4));
  put(leadSeconds, () => random.normal(model.leftOnWatts, 0.04));
  put(150, () => random.normal(7, 0.6));
  const joules = model.litres * WATER_J_PER_LITRE_KELVIN * (model.washCelsius - model.inletCelsius) * 1.08;
  let warmed = 0;
  while (warmed < joules) {
    const level = random.normal(model.heaterWatts, 11) + (watts.length % 18 < 12 ? model.drumWatts : 0);
    watts.push(level);
    warmed += level;
  }
  put(1500, drum);
  // The thermostat lets the water fall a few degrees, then heats once more, briefly.
  put(95, (t) => random.normal(model.heaterWatts, 11) + drum(t));
  put(1080, drum);
  for (let rinse = 0; rinse < 2; rinse += 1) {
    put(200, () => random.normal(32, 3));
    put(420, drum);
  }
  put(620, (t) => model.spinWatts * Math.min(1, 0.3 + t / 260) + random.normal(0, 14));
  put(tailSeconds, () => random.normal(model.leftOnWatts, 0.04));
  return { watts: Float64Array.from(watts) };
}
