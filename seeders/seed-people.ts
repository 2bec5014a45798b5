import { hashPassword } from '@/lib/auth/commands/hash-password';
import { now } from '@/lib/platform/clock';
import type { Work } from '@/lib/platform/database/transaction';
import { publicId } from '@/lib/platform/ids';
import { addInstrument } from '@/lib/reports/commands/instruments';
import type { InstrumentInput } from '@/lib/reports/schema';
import { DEMONSTRATION_ACCOUNTS } from '@/lib/platform/demonstration-accounts';

/** A member of the demonstration, with the instrument they measure with. */
export interface SeededMember {
  id: number;
  publicId: string;
  name: string;
  instrumentPublicId: string;
  instrument: InstrumentInput;
}

const meter = (input: Partial<InstrumentInput> & Pick<InstrumentInput, 'name' | 'modelName'>): InstrumentInput => ({
  kind: 'plug-in-meter',
  percentOfReading: 1,
  percentOfRange: 0,
  rangeWatts: null,
  counts: 1,
  resolutionWatts: 0.1,
  resolutionWattHours: 10,
  lowerLimitWatts: 0.5,
  readsTruePower: true,
  supplies: ['ac-230'],
  averagingSeconds: null,
  calibratedOn: null,
  ...input,
});

/** Kinds of instrument that are about on the island, by stated accuracy; they bear no brand. */
const INSTRUMENTS: InstrumentInput[] = [
  meter({ name: 'Harbour shop meter', modelName: 'plug-in, 1 %' }),
  meter({
    name: 'Grey socket meter',
    modelName: 'plug-in, 2 %',
    percentOfReading: 2,
    lowerLimitWatts: 1,
  }),
  meter({
    name: 'Metering breaker, kitchen',
    modelName: 'breaker, 1.5 %',
    kind: 'metering-breaker',
    percentOfReading: 1.5,
    counts: 0,
    lowerLimitWatts: 2,
    resolutionWattHours: 1,
  }),
  meter({
    name: 'School analyser',
    modelName: 'bench, 0.2 %',
    kind: 'bench-analyser',
    percentOfReading: 0.2,
    percentOfRange: 0.05,
    rangeWatts: 600,
    counts: 0,
    resolutionWatts: 0.01,
    lowerLimitWatts: 0.01,
    calibratedOn: '2026-05-11',
  }),
];

export async function seedPeople(work: Work): Promise<Map<string, SeededMember>> {
  const members = new Map<string, SeededMember>();
  for (const [i, account] of DEMONSTRATION_ACCOUNTS.entries()) {
    const row = await work.models.Member.create(
      {
        publicId: publicId(),
        email: account.email,
        passwordHash: await hashPassword(account.password),
        role: account.role,
        state: 'active',
        confirmedAt: now(),
        createdAt: now(),
      },
      { transaction: work.transaction },
    );
    await work.models.PersonalDetail.create(
      { memberId: row.id, name: account.name, region: account.region, updatedAt: now() },
      { transaction: work.transaction },
    );
    const instrument = INSTRUMENTS[i % INSTRUMENTS.length] as InstrumentInput;
    const instrumentPublicId = await addInstrument(work, row.id, instrument);
    members.set(account.key, {
      id: row.id,
      publicId: row.publicId,
      name: account.name,
      instrumentPublicId,
      instrument,
    });
  }
  return members;
}
