import type { Load } from './load';
import type { Random } from './random';

/** What an instrument does to the truth: its own gain and offset within its stated accuracy, its step and its floor. */
export interface InstrumentModel {
  gain: number;
  offsetWatts: number;
  stepWatts: number;
  /** Below this it shows nothing. */
  floorWatts: number;
  /** Seconds from one row to the next, and how much that wavers. */
  everySeconds: number;
  waverSeconds: number;
}

export interface Reading {
  /** Seconds from the start of the load. */
  at: number;
  watts: number;
}

/** An instrument of this stated accuracy, with an error of its own that stays well within it. */
export function drawInstrument(
  stated: { percentOfReading: number; stepWatts: number; floorWatts: number },
  every: { seconds: number; waver: number },
  random: Random,
): InstrumentModel {
  return {
    gain: 1 + (random.between(-0.6, 0.6) * stated.percentOfReading) / 100,
    offsetWatts: random.between(-0.4, 0.4) * stated.stepWatts,
    stepWatts: stated.stepWatts,
    floorWatts: stated.floorWatts,
    everySeconds: every.seconds,
    waverSeconds: every.waver,
  };
}

/** What the instrument writes down: means over its interval, with its error, floor and step. */
export function record(load: Load, instrument: InstrumentModel, random: Random): Reading[] {
  const readings: Reading[] = [];
  let from = 0;
  while (from < load.watts.length) {
    const waver = instrument.waverSeconds === 0 ? 0 : Math.round(random.between(-1, 1) * instrument.waverSeconds);
    const to = Math.min(load.watts.length, from + Math.max(1, instrument.everySeconds + waver));
    let sum = 0;
    for (let t = from; t < to; t += 1) sum += load.watts[t] ?? 0;
    const shown = (sum / (to - from)) * instrument.gain + instrument.offsetWatts;
    const stepped = Math.round(shown / instrument.stepWatts) * instrument.stepWatts;
    readings.push({ at: to, watts: Math.abs(stepped) < instrument.floorWatts ? 0 : stepped });
    from = to;
  }
  return readings;
}
