import type { ComparableClaim, ComparableFigure } from './types';

const SAME_ROOM_KELVIN = 2;
/** The interval over which a maximum is averaged before it is set beside a claim. */
export const MAXIMUM_AVERAGING_SECONDS = 10;

/**
 * Why a figure and a claim are not about the same thing, as a reader is told; null where nothing stands in the way.
 *
 * @example findObstacle({ modeCode: 'idle', … }, { modeCode: 'standby', … })
 * // 'The claim’s mode is not one that was measured.'
 */
export function findObstacle(figure: ComparableFigure, claim: ComparableClaim): string | null {
  return ofMeaning(figure, claim) ?? ofPower(figure, claim) ?? ofRoom(figure, claim);
}

function ofMeaning(figure: ComparableFigure, claim: ComparableClaim): string | null {
  if (claim.contradictsMode !== null) return claim.contradictsMode;
  if (claim.modeCode !== null && figure.modeCode !== null && claim.modeCode !== figure.modeCode) {
    return 'The claim’s mode is not one that was measured.';
  }
  if (claim.variantId !== null && figure.variantId !== null && claim.variantId !== figure.variantId) {
    return 'The claim is about another variant.';
  }
  return null;
}

function ofPower(figure: ComparableFigure, claim: ComparableClaim): string | null {
  if (figure.powerKind === 'apparent' && claim.unit !== 'VA') {
    return 'What was measured is apparent power (VA), which says nothing certain about watts.';
  }
  if (claim.kind === 'maximum') {
    return figure.quantity === 'maximum-power' && figure.averagingSeconds === MAXIMUM_AVERAGING_SECONDS
      ? null
      : 'A maximum compares with the highest 10-second mean alone.';
  }
  if (figure.quantity === 'maximum-power' || figure.quantity === 'minimum-power') {
    return 'The claim is about a mean, not about the highest or lowest reading.';
  }
  return null;
}

/** What a thermostat draws in a day depends on its room: 18 °C against 24 °C is 30 % for a refrigerator. */
function ofRoom(figure: ComparableFigure, claim: ComparableClaim): string | null {
  if (figure.duty !== 'cyclic' || figure.quantity !== 'day-energy') return null;
  if (claim.ambientCelsius === null)
    return 'The claim does not state the room’s temperature, and its figure depends on it.';
  if (figure.ambientCelsius === null) return 'The room’s temperature was not recorded, and the claim depends on it.';
  if (Math.abs(figure.ambientCelsius - claim.ambientCelsius) > SAME_ROOM_KELVIN) {
    return `The claim is for a room of ${claim.ambientCelsius} °C; it was measured at ${figure.ambientCelsius} °C.`;
  }
  if (figure.defrostIncluded === null) return 'Whether a defrost is part of what was measured was not stated.';
  return null;
}
