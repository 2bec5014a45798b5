import type { UncertaintyParts } from './types';

/**
 * The standard uncertainty of a figure from its parts, by root sum of squares. Gain and offset of one instrument are two
 * ends of one half-width: they add before they are squared.
 *
 * Source: JCGM 100:2008 (GUM), 5.1.2.
 * @example combineParts({ gain: 0.3, offset: 0.1, resolution: 0, repeatability: 0.3, drift: 0, belowLimit: 0 }) // 0.5
 */
export function combineParts(parts: UncertaintyParts): number {
  const { gain, offset, resolution, repeatability, drift, belowLimit } = parts;
  return Math.hypot(gain + offset, resolution, repeatability, drift, belowLimit);
}

/** The parts times a factor: from watts to watt-hours a day, say. */
export function scaleParts(parts: UncertaintyParts, factor: number): UncertaintyParts {
  return {
    gain: parts.gain * factor,
    offset: parts.offset * factor,
    resolution: parts.resolution * factor,
    repeatability: parts.repeatability * factor,
    drift: parts.drift * factor,
    belowLimit: parts.belowLimit * factor,
  };
}
