import { OUTCOME_WORDS } from '@/lib/measurement/claims/outcome-words';
import type { ClaimBeside, ClaimedFigure } from '@/lib/claims/rules';

interface OutcomeLineProps {
  beside: ClaimBeside<ClaimedFigure>;
  /** Which figure the claim is about. */
  of: string;
}

/** The bracket is the maker's and slate; the outcome is ours and in ink. */
export function OutcomeLine({ beside, of }: OutcomeLineProps) {
  const { comparison, sentence } = beside;
  const words = comparison ? OUTCOME_WORDS[comparison.outcome] : 'not measured yet';
  return (
    <p className="mt-3 flex max-w-prose gap-2.5 text-note">
      <svg viewBox="0 0 22 12" width="22" height="12" aria-hidden="true" className="mt-1.5 shrink-0">
        <path d="M1.5 11V2.5h19V11" className="fill-none stroke-slate" strokeWidth="2" />
      </svg>
      <span>
        <span className="block font-semibold">
          {of}: {words}
        </span>
        <span className="block text-muted">{sentence}</span>
      </span>
    </p>
  );
}
