import type { Load } from './load';
import type { Random } from './random';

export interface ThermostatModel {
  /** Power of the compressor in steady running (W). */
  runningWatts: number;
  /** What control and lamp take between cycles (W). */
  restingWatts: number;
  /** Heat leaking in, as a share of the pull-down rate at a difference of 1 K: sets the duty with the room. */
  leakPerKelvin: number;
  roomCelsius: number;
  setCelsius: number;
  hysteresisKelvin: number;
  /** How fast the contents cool while the compressor runs (K an hour). */
  coolingKelvinPerHour: number;
  openingsPerDay: number;
}

/**
 * A cabinet with one temperature: heat leaks in by the difference to the room, the compressor pulls it out, a lid that
 * is opened lets some in at once. The compressor starts with an inrush of a second and settles within minutes.
 */
export function simulateThermostat(model: ThermostatModel, seconds: number, random: Random): Load {
  const watts = new Float64Array(seconds);
  let inside = model.setCelsius + random.between(-0.5, 0.5) * model.hysteresisKelvin;
  let running = false;
  let since = 0;
  for (let t = 0; t < seconds; t += 1) {
    const hour = (t / 3600) % 24;
    const awake = hour > 7 && hour < 22;
    const room = model.roomCelsius + 0.7 * Math.sin(((hour - 9) / 24) * 2 * Math.PI);
    inside += (model.leakPerKelvin * model.coolingKelvinPerHour * (room - inside)) / 3600;
    if (awake && random.uniform() < model.openingsPerDay / (15 * 3600)) inside += random.between(0.2, 0.8);
    if (running) inside -= model.coolingKelvinPerHour / 3600;
    if (!running && inside > model.setCelsius + model.hysteresisKelvin / 2) {
      running = true;
      since = 0;
    } else if (running && inside < model.setCelsius - model.hysteresisKelvin / 2) {
      running = false;
    }
    watts[t] = running ? compressor(model, since, random) : model.restingWatts + random.normal(0, 0.03);
    since += 1;
  }
  return { watts };
}

function compressor(model: ThermostatModel, since: number, random: Random): number {
  const inrush = since === 0 ? 3.6 : 1;
  const settling = 1 + 0.14 * Math.exp(-since / 240);
  return model.runningWatts * inrush * settling + random.normal(0, 0.6);
}
