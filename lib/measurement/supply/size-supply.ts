import { settingProblems, type SupplyInputName, type SupplySettings } from './inputs';
import { inverterNeed, type InverterNeed } from './inverter';
import type { SupplyLoad, TwoSided } from './loads';
import { nightShare } from './night';

/** What a supply has to carry, once. */
export interface SupplySize {
  /** Wh a day at the battery: the inverter's loss once, and its own draw. */
  dayWattHours: number;
  /** The same in Ah at the system's voltage. */
  dayAmpHours: number;
  /** Wh at the battery between the two times of the night. */
  nightWattHours: number;
  /** All on at once, at the loads (W). */
  simultaneousWatts: number;
  /** The largest start-up over the rest running, at the loads (W). */
  surgeWatts: number;
  battery: { wattHours: number; ampHours: number };
  arrayWatts: number;
  /** Of the loads that an inverter feeds. */
  inverter: InverterNeed;
}

export type SupplySizing =
  | { ok: true; typical: SupplySize; cautious: SupplySize }
  | { ok: false; problems: { name: SupplyInputName; message: string }[] };

/**
 * What a supply needs to carry some loads, typical and cautious. Arithmetic, not a design: the local code and a licensed
 * person decide.
 *
 * Battery: day energy × days of autonomy / (depth of discharge × discharge efficiency × temperature factor). Array: day
 * energy / (peak sun hours × performance ratio).
 * Source of the check: a public stand-alone sizing worksheet.
 * @example sizeSupply([steadyLoad('lights', 150, 2)], { ...defaultSettings(), inverterEfficiency: 0.85 })
 *   // typical.dayWattHours 352.9…
 */
export function sizeSupply(loads: readonly SupplyLoad[], settings: SupplySettings): SupplySizing {
  const problems = settingProblems(settings);
  if (problems.length > 0) return { ok: false, problems };
  return { ok: true, typical: sizeAt('typical', loads, settings), cautious: sizeAt('cautious', loads, settings) };
}

function sizeAt(end: keyof TwoSided, loads: readonly SupplyLoad[], settings: SupplySettings): SupplySize {
  const night = { fromHour: settings.nightFromHour, toHour: settings.nightToHour };
  const atBattery = ({ dayWattHours, behindInverter }: SupplyLoad) =>
    dayWattHours[end] / (behindInverter ? settings.inverterEfficiency : 1);
  const sum = (of: (load: SupplyLoad) => number) => loads.reduce((total, load) => total + of(load), 0);
  // An inverter without a load is not there.
  const ownWattHours = loads.some((load) => load.behindInverter) ? settings.inverterOwnWatts * 24 : 0;
  const dayWattHours = sum(atBattery) + ownWattHours;
  const stored =
    (dayWattHours * settings.autonomyDays) /
    (settings.depthOfDischarge * settings.dischargeEfficiency * settings.temperatureFactor);
  const needs = (of: readonly SupplyLoad[]) =>
    inverterNeed(
      of.map(({ runningWatts, startWatts, hoursPerDay }) => {
        return { runningWatts: runningWatts[end], startWatts: startWatts?.[end] ?? null, hoursPerDay };
      }),
    );
  const all = needs(loads);
  return {
    dayWattHours,
    dayAmpHours: dayWattHours / settings.systemVolts,
    nightWattHours:
      sum((load) => atBattery(load) * nightShare(load.window, night)) + ownWattHours * nightShare(null, night),
    simultaneousWatts: all.continuousWatts,
    surgeWatts: all.surgeWatts,
    battery: { wattHours: stored, ampHours: stored / settings.systemVolts },
    arrayWatts: dayWattHours / (settings.peakSunHours * settings.performanceRatio),
    inverter: needs(loads.filter((load) => load.behindInverter)),
  };
}
