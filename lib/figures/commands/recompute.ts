import 'server-only';
import { recordEvent } from '@/lib/platform/database/record-event';
import type { Work } from '@/lib/platform/database/transaction';
import { storedContributions, storedFigures, type CountedDevice } from '../queries/stored-figures';
import {
  categoriesOf,
  devicesOfCategories,
  everyScope,
  settingsOfDevices,
  verifiedFigures,
  type Reading,
} from '../queries/verified-figures';
import type { ScopedFigure } from '../rules/columns';
import { findDifferences, figureKey } from '../rules/differences';
import { byNumber, expectedOfCategory, expectedOfDevice } from './expected-figures';
import { lockScopes } from './lock-scopes';
import { writeFigures } from './write-figures';

/**
 * Recomputes what a command touched, in its own transaction: each touched device and its category, from the rows that
 * stand at this moment. A category that was touched itself may pool in another way now, so all its devices are redone.
 */
export async function recomputeTouched(work: Work): Promise<void> {
  if (work.touched.length === 0) return;
  const idsOf = (kind: 'device' | 'category') =>
    work.touched.filter((scope) => scope.kind === kind).map((scope) => scope.id);
  const categoryIds = idsOf('category');
  const deviceIds = rising([...idsOf('device'), ...(await devicesOfCategories(work, categoryIds))]);

  const deviceScopes = await lockScopes(work, 'device', deviceIds);
  // Only now: what another transaction committed while this one waited for the lock has to be seen.
  const devices = await settingsOfDevices(work, deviceIds);
  const figures = byNumber(await verifiedFigures(work, deviceIds), (figure) => figure.ofDevice);
  const expected = devices.flatMap((device) => expectedOfDevice(device, figures.get(device.deviceId) ?? []).figures);
  const stored = await storedFigures(work, { deviceIds, categoryIds: [] });
  await writeFigures(work, { device: deviceScopes, category: new Map() }, findDifferences(stored, expected));

  const touchedCategories = rising([...categoryIds, ...devices.map((device) => device.categoryId)]);
  await recomputeCategories(work, touchedCategories);
  dropTags(work, deviceIds, touchedCategories);
}

async function recomputeCategories(work: Work, categoryIds: number[]): Promise<void> {
  const category = await lockScopes(work, 'category', categoryIds);
  const contributions = byNumber(await storedContributions(work, categoryIds), (row) => row.categoryId);
  const expected = (await categoriesOf(work, categoryIds)).flatMap((one) =>
    expectedOfCategory(
      one,
      (contributions.get(one.id) ?? []).map((row) => row.contribution),
    ),
  );
  const stored = await storedFigures(work, { deviceIds: [], categoryIds });
  await writeFigures(work, { device: new Map(), category }, findDifferences(stored, expected));
}

/** Every figure that follows from all verified reports, from nothing but them. */
export async function computeFromScratch(reading: Reading): Promise<ScopedFigure[]> {
  const { deviceIds, categoryIds } = await everyScope(reading);
  const devices = await settingsOfDevices(reading, deviceIds);
  const figures = byNumber(await verifiedFigures(reading, deviceIds), (figure) => figure.ofDevice);
  const contributions = new Map<number, CountedDevice[]>(categoryIds.map((id) => [id, []]));
  const expected: ScopedFigure[] = [];
  for (const device of devices) {
    const ofDevice = expectedOfDevice(device, figures.get(device.deviceId) ?? []);
    for (const figure of ofDevice.figures) expected.push(figure);
    contributions.get(device.categoryId)?.push(...ofDevice.contributions);
  }
  for (const category of await categoriesOf(reading, categoryIds)) {
    expected.push(...expectedOfCategory(category, contributions.get(category.id) ?? []));
  }
  return expected;
}

/** What is stored beside what follows from the reports: one line a difference, none where all is equal. */
export async function checkFigures(reading: Reading): Promise<string[]> {
  const expected = await computeFromScratch(reading);
  const stored = await storedFigures(reading, await everyScope(reading));
  return findDifferences(stored, expected).flatMap(({ stored: found, expected: wanted, details }) => {
    const figure = wanted ?? found;
    return details.map((detail) => `${figure ? figureKey(figure) : ''}: ${detail}`);
  });
}

/** Recomputes everything from scratch and repairs what differs. Every device and category is locked meanwhile. */
export async function recomputeAll(work: Work): Promise<{ repaired: number }> {
  const { deviceIds, categoryIds } = await everyScope(work);
  const device = await lockScopes(work, 'device', deviceIds);
  const category = await lockScopes(work, 'category', categoryIds);
  const expected = await computeFromScratch(work);
  const differences = findDifferences(await storedFigures(work, { deviceIds, categoryIds }), expected);
  if (differences.length > 0) {
    await recordEvent(work, {
      actorId: null,
      action: 'figures.recomputed',
      subject: { kind: 'figures', id: 0 },
      after: { repaired: differences.length },
    });
    await writeFigures(work, { device, category }, differences);
  }
  dropTags(work, deviceIds, categoryIds);
  return { repaired: differences.length };
}

function dropTags(work: Work, deviceIds: number[], categoryIds: number[]): void {
  for (const id of deviceIds) work.dropTag(`device:${id}`);
  for (const id of categoryIds) work.dropTag(`category:${id}`);
  work.dropTag('catalogue');
}

const rising = (ids: number[]) => [...new Set(ids)].sort((a, b) => a - b);
