import type { ConditionField, UsePattern } from '@/lib/catalogue/schema';
import type { Duty } from '@/lib/measurement/units/quantity';
import type { ModeCode } from './modes';

export interface CategorySeed {
  name: string;
  parent: string | null;
  summary: string;
  duty: Duty;
  basis: { quantity: 'mean-power' | 'day-energy' | 'use-energy'; mode: ModeCode | null };
  modes: [ModeCode, string][];
  unitSpread: number;
  mayBeSwitchedOff: boolean;
  usePattern: UsePattern;
  conditions: ConditionField[];
  cautions: string[];
}

const condition = (key: string, label: string, unit: string | null, hint: string): ConditionField => ({
  key,
  label,
  unit,
  hint,
});

/** Groups that hold categories and have no devices of their own. */
export const CATEGORY_GROUPS = ['Cold appliances', 'Network', 'Laundry'] as const;

export const CATEGORIES: readonly CategorySeed[] = [
  {
    name: 'Chest freezer',
    parent: 'Cold appliances',
    summary:
      'A thermostat switches the compressor on and off all day, so only the energy of whole days compares. The room, the door and what was just put in move it more than the model does.',
    duty: 'cyclic',
    basis: { quantity: 'day-energy', mode: null },
    modes: [
      ['cycling', 'a day or more, in whole cycles'],
      ['running', 'door shut, contents cold'],
      ['between-cycles', 'controller and lamp only'],
      ['fast-freeze', 'held on by hand'],
    ],
    unitSpread: 0.05,
    mayBeSwitchedOff: false,
    usePattern: { hoursByMode: { cycling: 24 }, usesPerDay: null },
    conditions: [
      condition('setting', 'Thermostat setting', null, 'As the dial or display says.'),
      condition('fill', 'How full', '%', 'Roughly; a full freezer swings less.'),
      condition('openings', 'Lid openings a day', null, 'Counted or guessed; say which in the notes.'),
    ],
    cautions: [
      'A freezer is not for switching off: food can spoil unseen, and the heat that comes in has to be pumped out again. No saving is shown for it. Follow your food authority; if medicines are kept inside, ask the pharmacist first.',
      'Let its own control stop it. After a cut, wait the maker’s minimum off time before the compressor starts again.',
    ],
  },
  {
    name: 'Router',
    parent: 'Network',
    summary:
      'Always on, so its idle draw is nearly all of its energy. Radios and clients move it by a watt or two; what it does for the half minute of a boot hardly counts.',
    duty: 'continuous',
    basis: { quantity: 'mean-power', mode: 'idle' },
    modes: [
      ['boot', 'first minutes after switching on'],
      ['idle', 'radios on, clients quiet'],
      ['busy', 'a download as fast as the line allows'],
    ],
    unitSpread: 0.05,
    mayBeSwitchedOff: true,
    usePattern: { hoursByMode: { idle: 21, busy: 3 }, usesPerDay: null },
    conditions: [
      condition('radios', 'Radios that are on', null, 'For example: 2.4 and 5 GHz.'),
      condition('clients', 'Connected clients', null, 'How many were connected.'),
      condition('firmware', 'Firmware', null, 'As its settings page says.'),
    ],
    cautions: ['Alarms, calls for help and neighbours may depend on the network. Tell them before you switch it off.'],
  },
  {
    name: 'Washing machine',
    parent: 'Laundry',
    summary:
      'Nearly all of a programme’s energy heats water, so programme, temperature and inlet water decide. Compare the energy of whole programmes, never the watts of a moment.',
    duty: 'per-use',
    basis: { quantity: 'use-energy', mode: null },
    modes: [
      ['programme', 'from start to end'],
      ['heating', 'heater on'],
      ['wash', 'drum turning'],
      ['spin', 'at speed'],
      ['left-on', 'after the end'],
    ],
    unitSpread: 0.05,
    mayBeSwitchedOff: true,
    usePattern: { hoursByMode: { 'left-on': 1 }, usesPerDay: 0.6 },
    conditions: [
      condition('programme', 'Programme', null, 'As the panel says, with its temperature.'),
      condition('load', 'Load', 'kg', 'Dry weight.'),
      condition('inlet', 'Inlet water', '°C', 'Measured at the tap after a minute of running.'),
    ],
    cautions: [
      'Keep lead, meter and socket dry. Never reach behind the machine with wet hands, and never open it while it is plugged in.',
    ],
  },
];
