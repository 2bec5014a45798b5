/** Operating modes that the categories of this step share; codes are lasting, names are what readers see. */
export const OPERATING_MODES = [
  ['off', 'Off', 'Switched off at the device, still plugged in.'],
  ['standby', 'Standby', 'Waiting to be switched on; no connection is kept.'],
  ['networked-standby', 'Networked standby', 'Asleep, but answering its network.'],
  ['idle', 'Idle', 'On and ready, with nothing asked of it.'],
  ['busy', 'Busy', 'Working as hard as it is ordinarily asked to.'],
  ['boot', 'Boot', 'From switching on until it is ready.'],
  ['cycling', 'Cycling', 'Whole cycles of its own thermostat, on and off.'],
  ['running', 'Compressor running', 'The part of a cycle in which the compressor works.'],
  ['between-cycles', 'Between cycles', 'The part of a cycle in which the compressor rests.'],
  ['fast-freeze', 'Fast freeze', 'The compressor held on by hand to freeze fresh food.'],
  ['programme', 'Whole programme', 'One programme from start to end.'],
  ['heating', 'Heating', 'The heater of a programme is on.'],
  ['wash', 'Wash', 'The drum turns, the heater is off.'],
  ['spin', 'Spin', 'The drum spins at speed.'],
  ['left-on', 'Left on', 'The programme is over and nobody has switched it off.'],
] as const;

export type ModeCode = (typeof OPERATING_MODES)[number][0];
