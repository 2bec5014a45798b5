import { compareWithClaim } from '@/lib/measurement/claims/compare-with-claim';
import { outcomeSentence } from '@/lib/measurement/claims/outcome-sentence';
import type { ClaimComparison, ComparableClaim } from '@/lib/measurement/claims/types';
import type { Duty, PowerKind, Quantity } from '@/lib/measurement/units/quantity';
import type { Claim } from './schema';

/** A published figure of a device, as far as its claims are compared with it. */
export interface ClaimedFigure {
  mode: { code: string } | null;
  quantity: Quantity;
  powerKind: PowerKind;
  isMain: boolean;
  median: number;
  minimum: number;
  maximum: number;
  atMost: boolean;
  n: number;
  standardUncertainty: number | null;
  degreesOfFreedom: number | null;
}

/** A claim beside the figure that it is about, and how it fares. */
export interface ClaimBeside<F extends ClaimedFigure> {
  claim: Claim;
  /** Null where nothing that was measured is of its kind. */
  figure: F | null;
  comparison: ClaimComparison | null;
  sentence: string;
}

interface Circumstances {
  duty: Duty;
  /** The middle of the rooms in which the device was measured. */
  ambientCelsius: number | null;
}

/** Sets each claim beside the figure that it is about, in the order of the claims. */
export function compareClaims<F extends ClaimedFigure>(
  claims: readonly Claim[],
  figures: readonly F[],
  circumstances: Circumstances,
): ClaimBeside<F>[] {
  return claims.map((claim) => {
    const figure = figureOfClaim(claim, figures);
    if (!figure) {
      return { claim, figure: null, comparison: null, sentence: 'Nothing that was measured is of this kind yet.' };
    }
    const comparison = compareWithClaim(
      {
        quantity: figure.quantity,
        modeCode: figure.mode?.code ?? null,
        powerKind: figure.powerKind,
        value: figure.median,
        standardUncertainty: figure.standardUncertainty ?? 0,
        degreesOfFreedom: figure.degreesOfFreedom ?? 1,
        atMost: figure.atMost,
        variantId: null,
        ambientCelsius: circumstances.ambientCelsius,
        averagingSeconds: figure.quantity === 'maximum-power' ? 10 : null,
        duty: circumstances.duty,
      },
      comparableClaim(claim),
    );
    return { claim, figure, comparison, sentence: outcomeSentence(figure, claim, comparison) };
  });
}

function comparableClaim(claim: Claim): ComparableClaim {
  const { kind, lower, upper, singleValue, lastDigit, tolerancePercent, unit, usesPerYear, ambientCelsius } = claim;
  return {
    kind,
    lower,
    upper,
    singleValue,
    lastDigit,
    tolerancePercent,
    unit,
    usesPerYear,
    ambientCelsius,
    modeCode: claim.mode?.code ?? null,
    contradictsMode: claim.contradictsMode,
    variantId: claim.variant === null ? null : String(claim.variant.id),
  };
}

/** What a claim is about: energy of a day or a use, the highest mean of a maximum, or the power of its mode. */
function figureOfClaim<F extends ClaimedFigure>(claim: Claim, figures: readonly F[]): F | null {
  const main = figures.filter((figure) => figure.isMain);
  const ofQuantity = (quantity: Quantity) => main.find((figure) => figure.quantity === quantity) ?? null;
  if (claim.unit === 'Wh/use') return ofQuantity('use-energy');
  if (claim.unit === 'kWh/a' || claim.unit === 'Wh/d') return ofQuantity('day-energy') ?? ofQuantity('use-energy');
  const wanted: Quantity = claim.kind === 'maximum' ? 'maximum-power' : 'mean-power';
  const ofMode = main.filter((figure) => figure.mode?.code === claim.mode?.code);
  return (
    ofMode.find((figure) => figure.quantity === wanted) ??
    ofMode.find((figure) => figure.quantity === 'mean-power') ??
    null
  );
}
