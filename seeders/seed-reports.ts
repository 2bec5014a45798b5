import { writeFile } from 'node:fs/promises';
import path from 'node:path';
import { acceptPhoto } from '@/lib/reports/commands/photos';
import { sendReport } from '@/lib/reports/commands/send-report';
import { acceptTrace } from '@/lib/reports/commands/traces';
import type { Submission } from '@/lib/reports/schema';
import { incomingFolder, storedName } from '@/lib/platform/storage/files';
import { drawDisplay } from './draw-display';
import type { PlannedReport } from './report-plan';
import type { SeededDevice } from './seed-catalogue';
import type { SeededMember } from './seed-people';
import { writeLog } from './simulate/dialects';
import { drawInstrument, record, type Reading } from './simulate/instrument';
import type { Load } from './simulate/load';
import { simulateNetwork } from './simulate/network';
import { Random } from './simulate/random';
import { simulateThermostat } from './simulate/thermostat';
import { simulateWash } from './simulate/wash';

const ZONE = 'Atlantic/Faroe';
const START_HOUR = 8;

/**
 * Measures a planned report and sends it: the simulated load through the instrument into a logger's file, the file
 * through the importer, the member's phases, the report through the command that members use.
 *
 * @returns the report's public id.
 */
export async function seedReport(plan: PlannedReport, member: SeededMember, device: SeededDevice): Promise<string> {
  const random = new Random(`${plan.device} ${plan.member} ${plan.on}`);
  const load = simulate(plan, random);
  const { instrument } = member;
  const stepWatts = instrument.resolutionWatts;
  const quick = plan.load.kind === 'wash' ? { seconds: 2, waver: 0 } : { seconds: 10, waver: 2 };
  const model = drawInstrument(
    { percentOfReading: instrument.percentOfReading, stepWatts, floorWatts: instrument.lowerLimitWatts ?? 0 },
    quick,
    random,
  );
  const readings = record(load, model, random);
  const startMs = Date.parse(`${plan.on}T0${START_HOUR}:00:00Z`);
  const digits = Math.max(0, Math.round(-Math.log10(stepWatts)));
  const tracePublicId = await sendLog(member.id, plan, writeLog(plan.dialect, readings, startMs, digits));
  const offsetSeconds = await zoneOffsetSeconds(plan, startMs);
  const photos = plan.withPhoto ? [await sendPhoto(member.id, readings)] : [];
  const submission: Submission = {
    device: { from: 'catalogue', publicId: device.publicId, variantId: device.variantIds[plan.variant] ?? null },
    instrumentPublicId: member.instrumentPublicId,
    licenceAgreed: true,
    content: {
      variantLabel: null,
      unitLabel: null,
      methodCode: METHOD[plan.load.kind],
      cautionConfirmed: true,
      supplyClass: 'ac-230',
      supplyVolts: Math.round(random.between(226, 236)),
      hertz: 50,
      measuringPoint: 'plug',
      isOnlyLoad: true,
      ambientCelsius: plan.ambientCelsius,
      conditions: conditionsOf(plan),
      heldConstant: 'Setting and place.',
      measuredOn: plan.on,
      phases: phasesOf(plan, load, startMs / 1000 - offsetSeconds, tracePublicId),
      traces: [tracePublicId],
      photos,
      notes: plan.notes,
    },
  };
  return sendReport({
    memberId: member.id,
    clientKey: `seed ${plan.device} ${plan.member} ${plan.on}`,
    amendsPublicId: null,
    draftPublicId: null,
    submission,
  });
}

const METHOD: Record<PlannedReport['load']['kind'], string> = {
  thermostat: 'plug-in-whole-day',
  network: 'plug-in-whole-day',
  wash: 'plug-in-one-use',
};

/** Before and after a programme the machine stands on, which the log shows too. */
const LEAD_SECONDS = 300;
const TAIL_SECONDS = 900;

function simulate({ load }: PlannedReport, random: Random): Load {
  switch (load.kind) {
    case 'thermostat':
      return simulateThermostat(load.model, load.days * 86_400, random);
    case 'network':
      return simulateNetwork(load.model, load.hours * 3600, START_HOUR, random);
    case 'wash':
      return simulateWash(load.model, LEAD_SECONDS, TAIL_SECONDS, random);
  }
}

/** The diary's clock is the island's own, so its times are read as local ones. */
async function zoneOffsetSeconds(plan: PlannedReport, startMs: number): Promise<number> {
  if (plan.dialect === 'plain') return 0;
  const local = new Intl.DateTimeFormat('en-GB', { timeZone: ZONE, hour: 'numeric', hourCycle: 'h23' });
  const hour = Number(local.format(new Date(startMs)));
  return (hour - new Date(startMs).getUTCHours()) * 3600;
}

async function sendLog(memberId: number, plan: PlannedReport, text: string): Promise<string> {
  const file = path.join(await incomingFolder(), storedName('part'));
  await writeFile(file, text);
  const upload = { path: file, name: `${plan.device}-${plan.on}.csv`, bytes: Buffer.byteLength(text), fields: {} };
  const reading = await acceptTrace(memberId, upload, { zone: ZONE, corrections: {} });
  if (reading.status !== 'read')
    throw new Error(`A seeded log was not understood: ${JSON.stringify(reading.description.questions)}`);
  return reading.tracePublicId;
}

/** The display as it stood at the end of the log. */
async function sendPhoto(memberId: number, readings: readonly Reading[]) {
  const last = readings[readings.length - 1]?.watts ?? 0;
  const file = path.join(await incomingFolder(), storedName('part'));
  const picture = await drawDisplay(`${last.toFixed(1)} W`, 'power now');
  await writeFile(file, picture);
  const photo = await acceptPhoto(memberId, { path: file, name: 'display.png', bytes: picture.length, fields: {} });
  return { publicId: photo.publicId, kind: 'display' as const, caption: 'The display at the end of the log.' };
}

type Phases = Submission['content']['phases'];

/** Where the member, notebook in hand, says that each mode began and ended. */
function phasesOf({ load }: PlannedReport, { watts }: Load, startSeconds: number, tracePublicId: string): Phases {
  const phase = (modeCode: string, from: number, to: number, uses: number | null = null): Phases[number] => ({
    source: 'trace',
    modeCode,
    tracePublicId,
    fromSeconds: startSeconds + from,
    toSeconds: startSeconds + to,
    uses,
    note: '',
  });
  const end = watts.length;
  if (load.kind === 'thermostat') return [phase('cycling', 0, end)];
  if (load.kind === 'wash') {
    return [phase('programme', LEAD_SECONDS, end - TAIL_SECONDS, 1), phase('left-on', end - TAIL_SECONDS + 60, end)];
  }
  const { offSeconds, bootSeconds, busyHours } = load.model;
  const ready = offSeconds + bootSeconds + 60;
  const busyFrom = (busyHours[0] - START_HOUR) * 3600;
  const busyTo = (busyHours[1] - START_HOUR) * 3600;
  return [
    phase('boot', offSeconds + 5, offSeconds + bootSeconds),
    phase('idle', ready, busyFrom - 60),
    phase('busy', busyFrom + 60, busyTo - 60),
    phase('idle', busyTo + 60, end),
  ];
}

function conditionsOf({ load }: PlannedReport): Record<string, string> {
  if (load.kind === 'thermostat') return { setting: '−19 °C', fill: '50', openings: String(load.model.openingsPerDay) };
  if (load.kind === 'network') return { radios: '2.4 and 5 GHz', clients: '6', firmware: '4.2' };
  return { programme: 'cotton 40 °C', load: '5', inlet: String(load.model.inletCelsius) };
}
