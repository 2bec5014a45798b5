import '@/lib/figures/register';
import { moveClock } from '@/lib/platform/clock';
import { inTransaction } from '@/lib/platform/database/transaction';
import { PLANNED_REPORTS, type PlannedReport } from './report-plan';
import { seedCatalogue } from './seed-catalogue';
import { seedPeople } from './seed-people';
import { seedReport } from './seed-reports';
import { seedVerdict } from './seed-verdicts';

/** Days from the beginning of a measurement to its sending, and from there to the verdict. */
const SENT_AFTER_DAYS = 3;
const DECIDED_AFTER_DAYS = 2;

/**
 * The invented island, the same at every seeding: people, catalogue, claims, and reports that were measured, imported,
 * sent and decided by the very commands that members and moderators use, each at its own time.
 *
 * @param only which of the planned reports; tests take a few.
 */
export async function seedDemonstration(only: (plan: PlannedReport) => boolean = () => true): Promise<void> {
  setClock('2026-09-01', 0);
  const { members, devices } = await inTransaction(async (work) => ({
    members: await seedPeople(work),
    devices: await seedCatalogue(work),
  }));
  const plans = PLANNED_REPORTS.filter(only).sort((a, b) => (a.on < b.on ? -1 : 1));
  for (const plan of plans) {
    const member = members.get(plan.member);
    const device = devices.get(plan.device);
    if (!member || !device)
      throw new Error(`The plan names somebody or something unknown: ${plan.member}, ${plan.device}`);
    setClock(plan.on, SENT_AFTER_DAYS);
    const reportPublicId = await seedReport(plan, member, device);
    setClock(plan.on, SENT_AFTER_DAYS + DECIDED_AFTER_DAYS);
    await seedVerdict(plan, reportPublicId, members);
  }
  moveClock(0);
}

/** Moves this process's clock to noon so many days after a date. */
function setClock(date: string, daysLater: number): void {
  const wanted = Date.parse(`${date}T12:00:00Z`) + daysLater * 86_400_000;
  moveClock((wanted - Date.now()) / 1000);
}
