import type { Dialect } from './simulate/dialects';
import type { NetworkModel } from './simulate/network';
import type { ThermostatModel } from './simulate/thermostat';
import type { WashModel } from './simulate/wash';

/** What a report's device really does; the figures follow from the simulated trace, never from here. */
export type PlannedLoad =
  | { kind: 'thermostat'; model: ThermostatModel; days: number }
  | { kind: 'network'; model: NetworkModel; hours: number }
  | { kind: 'wash'; model: WashModel };

export type PlannedOutcome = 'verified' | 'submitted' | 'changes-requested' | 'declined' | 'withdrawn';

export interface PlannedReport {
  device: string;
  member: string;
  /** The day on which it begins. */
  on: string;
  load: PlannedLoad;
  dialect: Dialect;
  outcome: PlannedOutcome;
  ambientCelsius: number;
  variant: number;
  withPhoto: boolean;
  notes: string;
}

type Common = Partial<Omit<PlannedReport, 'device' | 'member' | 'on' | 'load'>>;

const plan = (device: string, member: string, on: string, load: PlannedLoad, more: Common = {}): PlannedReport => ({
  device,
  member,
  on,
  load,
  dialect: member.length % 2 === 0 ? 'plain' : 'diary',
  outcome: 'verified',
  ambientCelsius: load.kind === 'thermostat' ? load.model.roomCelsius : 19,
  variant: 0,
  withPhoto: false,
  notes: '',
  ...more,
});

/** A chest freezer: the leak grows with age, the compressor differs from unit to unit by a few watts. */
const freezer = (runningWatts: number, leakPerKelvin: number, roomCelsius: number, days = 2): PlannedLoad => ({
  kind: 'thermostat',
  days,
  model: {
    runningWatts,
    restingWatts: 1.9 + (runningWatts % 3) * 0.3,
    leakPerKelvin,
    roomCelsius,
    setCelsius: -19,
    hysteresisKelvin: 3,
    coolingKelvinPerHour: 9,
    openingsPerDay: 5,
  },
});

const router = (idleWatts: number, busyWatts: number, bootWatts: number): PlannedLoad => ({
  kind: 'network',
  hours: 26,
  model: { idleWatts, busyWatts, bootWatts, bootSeconds: 95, offSeconds: 120, busyHours: [19, 21] },
});

const wash = (inletCelsius: number, litres = 9.4, heaterWatts = 2030): PlannedLoad => ({
  kind: 'wash',
  model: { heaterWatts, drumWatts: 165, spinWatts: 410, leftOnWatts: 1.1, litres, inletCelsius, washCelsius: 40 },
});

export const PLANNED_REPORTS: readonly PlannedReport[] = [
  plan('kx140', 'ina', '2026-09-07', freezer(77.5, 0.0104, 20.1, 3), {
    withPhoto: true,
    notes: 'Stood in the pantry, half full of fish. The lid was opened four or five times a day.',
  }),
  plan('kx140', 'marten', '2026-09-12', freezer(81.2, 0.0107, 19.4)),
  plan('kx140', 'orla', '2026-09-16', freezer(75.1, 0.01, 19.8)),
  plan('kx140', 'bram', '2026-09-20', freezer(74.4, 0.0103, 20.6)),
  plan('kx140', 'sunniva', '2026-09-28', freezer(79.0, 0.0105, 19.2)),
  plan('kx140', 'teague', '2026-10-03', freezer(82.6, 0.0108, 20.4)),
  plan('kx140', 'wilma', '2026-10-09', freezer(76.3, 0.0101, 21.0)),
  plan('kx140', 'jorun', '2026-10-18', freezer(78.8, 0.0106, 19.9)),
  plan('kx140', 'eskil', '2026-10-25', freezer(86.4, 0.0152, 20.2), {
    notes: 'An old one: the seal of the lid is torn at the back, and ice grows there.',
  }),
  plan('kx140', 'tilda', '2026-11-20', freezer(77.9, 0.0104, 19.6), { outcome: 'submitted', withPhoto: true }),
  plan('frosta90', 'ina', '2026-09-24', freezer(61.5, 0.0098, 18.6)),
  plan('frosta90', 'corin', '2026-10-06', freezer(63.2, 0.0101, 18.1)),
  plan('frosta90', 'wilma', '2026-10-22', freezer(60.3, 0.0096, 18.4)),
  plan('frosta90', 'bram', '2026-11-02', freezer(64.8, 0.0102, 17.9)),
  plan('polarn250', 'orla', '2026-10-14', freezer(96.7, 0.0112, 17.5)),
  plan('polarn250', 'jorun', '2026-11-05', freezer(99.1, 0.0115, 16.8)),
  plan('tidal4', 'ina', '2026-09-10', router(7.4, 9.6, 12.1), {
    withPhoto: true,
    notes: 'Both radios on, six clients, firmware 4.2.',
  }),
  plan('tidal4', 'marten', '2026-09-19', router(7.1, 9.2, 11.8)),
  plan('tidal4', 'sunniva', '2026-10-01', router(7.8, 10.1, 12.6)),
  plan('tidal4', 'teague', '2026-10-11', router(7.5, 9.9, 12.0)),
  plan('tidal4', 'corin', '2026-10-20', router(7.2, 9.4, 11.7), { variant: 1 }),
  plan('tidal4', 'eskil', '2026-10-30', router(7.6, 9.8, 12.3), { variant: 1 }),
  plan('tidal4', 'jorun', '2026-11-18', router(7.3, 9.5, 11.9), { outcome: 'submitted' }),
  plan('beaconmini', 'orla', '2026-09-30', router(4.9, 6.1, 7.9)),
  plan('beaconmini', 'wilma', '2026-10-16', router(5.1, 6.4, 8.2)),
  plan('beaconmini', 'tilda', '2026-11-08', router(4.8, 6.0, 7.7)),
  plan('harbourlink', 'teague', '2026-11-11', router(8.9, 12.3, 14.8)),
  plan('harbourlink', 'bram', '2026-11-21', router(2.1, 2.6, 3.9), {
    outcome: 'changes-requested',
    notes: 'Measured behind its own adapter.',
  }),
  plan('lavanda7', 'marten', '2026-09-15', wash(11), { withPhoto: true }),
  plan('lavanda7', 'ina', '2026-10-05', wash(9.5)),
  plan('lavanda7', 'sunniva', '2026-10-21', wash(12.5)),
  plan('lavanda7', 'corin', '2026-11-03', wash(10)),
  plan('lavanda7', 'eskil', '2026-11-16', wash(30), {
    outcome: 'declined',
    notes: 'Filled from the hot tap to save time.',
  }),
  plan('trommel8', 'orla', '2026-10-27', wash(10.5, 8.1, 2160)),
  plan('trommel8', 'teague', '2026-11-09', wash(9, 8.4, 2140)),
  plan('trommel8', 'marten', '2026-11-14', wash(10, 8.2, 2150), { outcome: 'withdrawn' }),
];
