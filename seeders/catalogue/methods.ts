interface MethodSeed {
  code: string;
  name: string;
  summary: string;
  minimumSeconds: number;
  minimumCycles: number;
  caution: string;
  needsConfirmation: boolean;
}

const HOUR = 3600;

/** What a moderator looks at, whatever the method. */
export const CHECKLIST = [
  {
    key: 'identity',
    label: 'The device is the one named',
    hint: 'Rating plate legible; maker, model and variant agree with the catalogue.',
  },
  {
    key: 'instrument',
    label: 'The instrument can resolve it',
    hint: 'Stated accuracy and lower limit suit the figures; true power where the load needs it.',
  },
  {
    key: 'duration',
    label: 'Long enough',
    hint: 'The method’s minimum time, or its whole cycles; gaps explained.',
  },
  {
    key: 'conditions',
    label: 'Conditions recorded',
    hint: 'What the category asks for is there and plausible.',
  },
  {
    key: 'evidence',
    label: 'Evidence matches the numbers',
    hint: 'Trace and photos show what the figures say, and a set-up that is safe.',
  },
] as const;

export const METHODS: readonly MethodSeed[] = [
  {
    code: 'plug-in-whole-day',
    name: 'Plug-in meter, a whole day',
    summary:
      'For what draws by itself all day. Plug the meter in between socket and device, log or read it for a day or more, and cut nothing out.',
    minimumSeconds: 24 * HOUR,
    minimumCycles: 3,
    caution:
      'The weakest of socket, lead and meter sets the limit, and it is lower for hours-long loads. Uncoil reels, build no chains, keep it dry. Warmth, smell or browning: switch off upstream if that is safe, and stop.',
    needsConfirmation: false,
  },
  {
    code: 'plug-in-steady',
    name: 'Plug-in meter, steady state',
    summary:
      'For a mode that holds still. Let the device settle, then read or log for ten minutes or more, until five minutes differ from the whole by less than 5 %.',
    minimumSeconds: 600,
    minimumCycles: 0,
    caution:
      'The weakest of socket, lead and meter sets the limit. Uncoil reels, build no chains, keep it dry. Warmth, smell or browning: switch off upstream if that is safe, and stop.',
    needsConfirmation: false,
  },
  {
    code: 'plug-in-one-use',
    name: 'Plug-in meter, one whole use',
    summary:
      'For what is used and then rests. Start the log before the use and end it after; one report may hold several.',
    minimumSeconds: 60,
    minimumCycles: 0,
    caution:
      'A heater draws near a socket’s limit for a long time: no reels, no chains, no adapters. Warmth, smell or browning: switch off upstream if that is safe, and stop.',
    needsConfirmation: false,
  },
  {
    code: 'installed-meter',
    name: 'Meter installed in the wiring',
    summary:
      'For a circuit with this device alone on it. A metering breaker or panel meter that a licensed person has installed; you record its readings.',
    minimumSeconds: 600,
    minimumCycles: 0,
    caution:
      'Stop at the cover: inside is licensed work under your local code. Have the meter installed, enclosed and tested by a licensed person, and record its readings. Never wire a metering breaker loose on a bench.',
    needsConfirmation: true,
  },
];
