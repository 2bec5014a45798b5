import { findFlags } from '@/lib/measurement/aggregation/flags';
import { median } from '@/lib/measurement/statistics/median';
import { unitOf } from '@/lib/measurement/units/unit-of';
import type { ReportFigure, ReportView } from '@/lib/reports/schema';
import type { Warning } from '../schema';

/** What else is known of the same device in the same mode, quantity, power and supply. */
export interface Peers {
  figureId: number;
  /** The values of other reports that count. */
  values: number[];
  /** The category's published median, or null. */
  categoryMedian: number | null;
}

/** A trace or photo that stands in another report too. */
export interface SameFile {
  kind: 'trace' | 'photo';
  /** Which of the report's traces or photos, from 0. */
  index: number;
  reportPublicId: string;
  isSameMember: boolean;
}

export interface DeskFacts {
  report: Pick<ReportView, 'content' | 'figures' | 'instrument' | 'method'>;
  peers: readonly Peers[];
  sameFiles: readonly SameFile[];
}

const SPREAD_FROM = 5;
const LARGEST_FACTOR = 2;
const SLIP = { least: 300, most: 3000 };
const WIDE = 0.2;
const DISAGREEMENT = 0.02;

/** Everything about a report that a moderator should look at, in the order of the checklist. */
export function findWarnings({ report, peers, sameFiles }: DeskFacts): Warning[] {
  const byFigure = new Map(peers.map((known) => [known.figureId, known]));
  return [
    ...report.figures.flatMap((figure) => belowLimit(figure, report.instrument.lowerLimitWatts)),
    ...report.figures.flatMap(wideUncertainty),
    ...truePower(report),
    ...tooShort(report),
    ...report.figures.flatMap((figure) => againstPeers(figure, byFigure.get(figure.id))),
    ...energyAndPower(report.content.phases),
    ...sameFiles.map(sameFile),
  ];
}

/** "Idle, mean power". */
export function nameFigure({ modeName, quantity }: Pick<ReportFigure, 'modeName' | 'quantity'>): string {
  const words = quantity.replaceAll('-', ' ');
  return modeName === null ? words.charAt(0).toUpperCase() + words.slice(1) : `${modeName}, ${words}`;
}

function againstPeers(figure: ReportFigure, peers: Peers | undefined): Warning[] {
  const value = figure.censoredAt ?? figure.value;
  if (!peers || value <= 0) return [];
  const others = peers.values.filter((other) => other > 0);
  const reference = others.length > 0 ? median(others) : peers.categoryMedian;
  if (reference === null || reference <= 0) return [];
  const ratio = value > reference ? value / reference : reference / value;
  const name = nameFigure(figure);
  const beside = others.length > 0 ? `of ${others.length} other reports` : 'of its category';
  if (ratio >= SLIP.least && ratio <= SLIP.most) {
    const message = `${name} is ${round(value / reference)} times the median ${beside}: W taken for kW, or the other way?`;
    return [{ kind: 'unit-slip', check: 'evidence', message, pointer: null }];
  }
  if (others.length === 0) return [];
  // A censored figure above the others says nothing; below them its limit does.
  if (figure.censoredAt !== null && value > reference) return [];
  const isFlagged =
    others.length + 1 >= SPREAD_FROM
      ? findFlags(
          [...others, value].map((one) => ({ value: one, censored: false })),
          null,
        ).at(-1) === true
      : ratio > LARGEST_FACTOR;
  if (!isFlagged) return [];
  const unit = unitOf(figure.quantity, figure.powerKind);
  const [least, most] = [Math.min(...others), Math.max(...others)];
  const message = `${name} lies outside what ${others.length} other reports found: ${range(least, most)} ${unit}; here ${round(value)} ${unit}.`;
  return [{ kind: 'outside-spread', check: 'evidence', message, pointer: null }];
}

function belowLimit(figure: ReportFigure, limit: number | null): Warning[] {
  const isPower = figure.quantity.endsWith('-power');
  if (figure.censoredAt === null && !(isPower && limit !== null && Math.abs(figure.value) < limit)) return [];
  const message = `${nameFigure(figure)} lies below what the instrument reads (${round(figure.censoredAt ?? limit ?? 0)} ${unitOf(figure.quantity, figure.powerKind)}): it counts as “at most”.`;
  return [{ kind: 'below-limit', check: 'instrument', message, pointer: null }];
}

function wideUncertainty(figure: ReportFigure): Warning[] {
  const share = (2 * figure.standardUncertainty) / Math.abs(figure.value);
  if (figure.censoredAt !== null || !(share > WIDE)) return [];
  const message = `${nameFigure(figure)} is known to ± ${Math.round(100 * share)} % only, by the instrument’s stated accuracy and the recording.`;
  return [{ kind: 'wide-uncertainty', check: 'instrument', message, pointer: null }];
}

function truePower({ instrument, figures }: DeskFacts['report']): Warning[] {
  if (instrument.readsTruePower || figures.every((figure) => figure.powerKind === 'apparent')) return [];
  const message = 'The instrument does not read true power, but figures stand in watts.';
  return [{ kind: 'apparent-only', check: 'instrument', message, pointer: null }];
}

function tooShort({ content, method }: DeskFacts['report']): Warning[] {
  const seconds = content.phases.reduce(
    (total, phase) => total + (phase.source === 'typed' ? phase.durationSeconds : phase.toSeconds - phase.fromSeconds),
    0,
  );
  if (seconds >= method.minimumSeconds) return [];
  const message = `The phases last ${minutes(seconds)} in all; the method asks for ${minutes(method.minimumSeconds)}.`;
  return [{ kind: 'too-short', check: 'duration', message, pointer: '/phases' }];
}

function energyAndPower(phases: ReportView['content']['phases']): Warning[] {
  return phases.flatMap((phase, i): Warning[] => {
    if (phase.source !== 'typed' || phase.meanWatts === null || phase.energyWattHours === null) return [];
    const expected = (phase.meanWatts * phase.durationSeconds) / 3600;
    if (Math.abs(phase.energyWattHours - expected) <= DISAGREEMENT * Math.abs(expected)) return [];
    const message = `Phase ${i + 1}: ${phase.meanWatts} W over ${minutes(phase.durationSeconds)} is ${round(expected)} Wh, the report says ${round(phase.energyWattHours)} Wh.`;
    return [{ kind: 'energy-and-power', check: 'evidence', message, pointer: `/phases/${i}/energyWattHours` }];
  });
}

function sameFile({ kind, index, reportPublicId, isSameMember }: SameFile): Warning {
  const whose = isSameMember ? 'another report of this member' : 'a report of another member';
  const message = `The same ${kind} stands in ${whose}: ${reportPublicId}.`;
  return { kind: 'same-file', check: 'evidence', message, pointer: `/${kind}s/${index}` };
}

const round = (value: number) => String(Number(value.toPrecision(3)));
const range = (low: number, high: number) => (low === high ? round(low) : `${round(low)}–${round(high)}`);
const minutes = (seconds: number) =>
  seconds < 3600
    ? `${round(seconds / 60)} min`
    : seconds < 172_800
      ? `${round(seconds / 3600)} h`
      : `${round(seconds / 86_400)} days`;
