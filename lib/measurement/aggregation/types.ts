/** A figure of a verified report, with what is needed to say whose voice it is. */
export interface VerifiedFigure {
  figureId: string;
  reportId: string;
  revisionId: string;
  contributorId: string;
  /** Accounts of one household are one voice. */
  householdId: string | null;
  /** One physical specimen measured twice is one voice. */
  unitId: string | null;
  deviceId: string;
  /** The kind of instrument, as model: figures that all come from one model share its gain. */
  instrumentModel: string;
  value: number;
  standardUncertainty: number;
  /** The part of the uncertainty that scales with the reading. */
  gainUncertainty: number;
  /** "At most" this; null where the figure is no censored one. */
  censoredAt: number | null;
  setAside: { reason: string } | null;
}

/** One voice of a device, or one device of a category: what a stone on the pile stands for. */
export interface Voice {
  voiceId: string;
  /** The voice's median; a censored one's at the upper of its two readings. */
  value: number;
  censored: boolean;
  flagged: boolean;
}

/** What became of one figure: counted, or left out and why. */
export interface FigureInput {
  figureId: string;
  voiceId: string;
  value: number;
  counted: boolean;
  flagged: boolean;
  reason: string | null;
}

/** Every statistic of a pile. */
export type StatisticName =
  | 'median'
  | 'minimum'
  | 'maximum'
  | 'lowerQuartile'
  | 'upperQuartile'
  | 'intervalLow'
  | 'intervalHigh'
  | 'tenthPercentile'
  | 'ninetiethPercentile';

export interface Counts {
  devices: number;
  contributors: number;
  instruments: number;
  reports: number;
}

/** What the site publishes of a pile. Units are those of the figures that went in. */
export interface PublishedFigure {
  /** Voices of a device, devices of a category. */
  n: number;
  median: number;
  /** The median with censored figures at 0; equal to the median where they leave nothing open. */
  medianLow: number;
  minimum: number;
  maximum: number;
  /** From n = 4. */
  lowerQuartile: number | null;
  upperQuartile: number | null;
  /** Of the median, at least 95 %, from n = 6. */
  interval: { low: number; high: number; coverage: number } | null;
  /** Of a category from n = 10. */
  tenthPercentile: number | null;
  ninetiethPercentile: number | null;
  /** Censored figures leave the median open below: it is at most this. */
  atMost: boolean;
  /** Every statistic that censored figures leave open below: it is at most what stands here. */
  atMostOf: StatisticName[];
  standardUncertainty: number | null;
  degreesOfFreedom: number | null;
  flagged: number;
  setAside: number;
  counts: Counts;
  voices: Voice[];
  inputs: FigureInput[];
  ruleVersion: string;
}
