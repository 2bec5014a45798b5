import type { Claim } from '@/lib/claims/schema';
import type { ModeCode } from './modes';

export interface ClaimSeed
  extends
    Pick<Claim, 'kind' | 'lower' | 'upper' | 'unit' | 'term'>,
    Partial<
      Pick<Claim, 'singleValue' | 'lastDigit' | 'tolerancePercent' | 'definition' | 'modeReason' | 'contradictsMode'>
    > {
  mode: ModeCode | null;
  ambientCelsius?: number;
  usesPerYear?: number;
  readOn: string;
}

export interface DeviceSeed {
  key: string;
  category: string;
  maker: string;
  model: string;
  aliases: string[];
  variants: { generation: string; region: string | null; ratedWatts: number }[];
  claims: ClaimSeed[];
}

const single = (value: number, lastDigit: number) => ({ lower: value, upper: value, singleValue: true, lastDigit });

/** Makers, models and what their pages state: all invented. */
export const DEVICES: readonly DeviceSeed[] = [
  {
    key: 'kx140',
    category: 'Chest freezer',
    maker: 'Vennholm',
    model: 'KX-140',
    aliases: ['KX140', 'Vennholm Kista 140'],
    variants: [{ generation: 'second generation', region: null, ratedWatts: 110 }],
    claims: [
      {
        kind: 'annual-energy',
        ...single(241, 1),
        unit: 'kWh/a',
        term: 'annual consumption',
        definition: 'In a room of 20 °C, lid closed, half filled, from a test of 48 hours.',
        mode: 'cycling',
        modeReason: 'It covers whole days of the thermostat at work.',
        ambientCelsius: 20,
        readOn: '2026-09-03',
      },
      {
        kind: 'typical',
        lower: 60,
        upper: 75,
        unit: 'W',
        term: 'power in operation',
        definition: 'While the compressor works, at mid setting.',
        mode: 'running',
        modeReason: '“While the compressor works” is the running part of a cycle.',
        readOn: '2026-09-03',
      },
    ],
  },
  {
    key: 'frosta90',
    category: 'Chest freezer',
    maker: 'Ostrigg',
    model: 'Frosta 90',
    aliases: ['OF90'],
    variants: [{ generation: 'first generation', region: null, ratedWatts: 95 }],
    claims: [
      {
        kind: 'annual-energy',
        ...single(201, 1),
        unit: 'kWh/a',
        term: 'energy per year',
        definition: 'Measured over three days in a room of 18 °C.',
        mode: 'cycling',
        modeReason: 'It covers whole days of the thermostat at work.',
        ambientCelsius: 18,
        readOn: '2026-08-21',
      },
    ],
  },
  {
    key: 'polarn250',
    category: 'Chest freezer',
    maker: 'Hallmund',
    model: 'Polarn 250',
    aliases: [],
    variants: [{ generation: 'first generation', region: null, ratedWatts: 130 }],
    claims: [
      {
        kind: 'maximum',
        lower: null,
        upper: 130,
        unit: 'W',
        term: 'rated input',
        mode: 'running',
        modeReason: 'The rating plate states the most that the compressor takes.',
        readOn: '2026-10-02',
      },
    ],
  },
  {
    key: 'tidal4',
    category: 'Router',
    maker: 'Corrivane',
    model: 'Tidal 4',
    aliases: ['CT-4', 'Tidal Four'],
    variants: [
      { generation: 'hardware 1', region: null, ratedWatts: 24 },
      { generation: 'hardware 2', region: null, ratedWatts: 18 },
    ],
    claims: [
      {
        kind: 'typical',
        lower: 6,
        upper: 8,
        unit: 'W',
        term: 'average consumption',
        definition: 'Both radios on, no traffic, averaged over an hour.',
        mode: 'idle',
        modeReason: '“No traffic” with the radios on is idle.',
        readOn: '2026-09-14',
      },
    ],
  },
  {
    key: 'beaconmini',
    category: 'Router',
    maker: 'Corrivane',
    model: 'Beacon Mini',
    aliases: ['CBM'],
    variants: [{ generation: 'hardware 1', region: null, ratedWatts: 12 }],
    claims: [
      {
        kind: 'typical',
        ...single(3.5, 0.1),
        unit: 'W',
        term: 'idle power',
        definition: 'With radios asleep by schedule from 23:00 to 06:00.',
        mode: 'idle',
        modeReason: 'The maker’s own word.',
        contradictsMode: 'The maker’s “idle” is asleep by schedule; members measured with the radios on.',
        readOn: '2026-09-14',
      },
    ],
  },
  {
    key: 'harbourlink',
    category: 'Router',
    maker: 'Pellhaven',
    model: 'Harbourlink 2',
    aliases: ['HL2'],
    variants: [{ generation: 'first generation', region: null, ratedWatts: 30 }],
    claims: [],
  },
  {
    key: 'lavanda7',
    category: 'Washing machine',
    maker: 'Ostrigg',
    model: 'Lavanda 7',
    aliases: ['OL7'],
    variants: [{ generation: 'first generation', region: null, ratedWatts: 2100 }],
    claims: [
      {
        kind: 'use-energy',
        ...single(620, 10),
        unit: 'Wh/use',
        term: 'consumption, cotton 40 °C',
        definition: 'Full load of 7 kg, inlet water 15 °C.',
        mode: 'programme',
        modeReason: 'It covers one whole programme.',
        readOn: '2026-07-30',
      },
    ],
  },
  {
    key: 'trommel8',
    category: 'Washing machine',
    maker: 'Hallmund',
    model: 'Trommel 8 S',
    aliases: ['T8S', 'Trommel 8S'],
    variants: [{ generation: 'first generation', region: null, ratedWatts: 2200 }],
    claims: [],
  },
];
