/** A number that the reader may change, with where its default comes from and what it may be. */
export interface SupplyInput {
  default: number;
  from: string;
  minimum: number;
  maximum: number;
  unit: string;
}

const SHEET = 'the worked example of a public stand-alone sizing sheet';
const COMMON = 'common practice, no source';

/**
 * Everything a sizing asks for besides the loads. Where no default can be right, it says so: the sun of a place and the
 * night of a season are the reader's.
 */
export const SUPPLY_INPUTS = {
  inverterEfficiency: { default: 0.85, from: SHEET, minimum: 0.5, maximum: 1, unit: '' },
  inverterOwnWatts: {
    default: 0,
    from: 'none until you read it off the inverter’s sheet',
    minimum: 0,
    maximum: 500,
    unit: 'W',
  },
  systemVolts: { default: 24, from: SHEET, minimum: 5, maximum: 1000, unit: 'V' },
  autonomyDays: { default: 3, from: `${COMMON}; the sheet’s example takes 7`, minimum: 0.1, maximum: 30, unit: 'd' },
  depthOfDischarge: { default: 0.8, from: SHEET, minimum: 0.05, maximum: 1, unit: '' },
  dischargeEfficiency: { default: 0.95, from: COMMON, minimum: 0.5, maximum: 1, unit: '' },
  temperatureFactor: {
    default: 1,
    from: 'a battery at the temperature of its rating',
    minimum: 0.3,
    maximum: 1,
    unit: '',
  },
  peakSunHours: {
    default: 2,
    from: 'no default is right: take your place’s darkest month',
    minimum: 0.1,
    maximum: 9,
    unit: 'h',
  },
  performanceRatio: { default: 0.7, from: 'a public sizing primer', minimum: 0.2, maximum: 1, unit: '' },
  nightFromHour: { default: 18, from: 'your own evening', minimum: 0, maximum: 24, unit: 'h' },
  nightToHour: { default: 8, from: 'your own morning', minimum: 0, maximum: 24, unit: 'h' },
} as const satisfies Record<string, SupplyInput>;

export type SupplyInputName = keyof typeof SUPPLY_INPUTS;
export type SupplySettings = Record<SupplyInputName, number>;

/** What stands where the reader changed nothing. */
export function defaultSettings(): SupplySettings {
  const entries = Object.entries(SUPPLY_INPUTS).map(([name, input]) => [name, input.default]);
  return Object.fromEntries(entries) as SupplySettings;
}

/**
 * Which settings lie outside their range, in words; none where all are within.
 *
 * @example settingProblems({ ...defaultSettings(), depthOfDischarge: 1.2 }) // one problem
 */
export function settingProblems(settings: SupplySettings): { name: SupplyInputName; message: string }[] {
  return (Object.keys(SUPPLY_INPUTS) as SupplyInputName[]).flatMap((name) => {
    const { minimum, maximum, unit } = SUPPLY_INPUTS[name];
    const value = settings[name];
    if (value >= minimum && value <= maximum) return [];
    return [{ name, message: `Take a number from ${minimum} to ${maximum}${unit === '' ? '' : ` ${unit}`}.` }];
  });
}
