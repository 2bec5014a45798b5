import { Transaction } from 'sequelize';
import { checkFigures } from '@/lib/figures/commands/recompute';
import { database } from '@/lib/platform/database/connection';
import type { PublishedFigure } from '@/models/published-figure';
import type { MadeDevice } from '../../factories/catalogue';

/** What is published of a device or a category, the smallest median first. */
export async function figuresOf(
  scope: { deviceId: number } | { categoryId: number },
  supplyStratum?: PublishedFigure['supplyStratum'],
): Promise<PublishedFigure[]> {
  const { FigureScope, PublishedFigure } = database().models;
  const row = await FigureScope.findOne({ where: scope });
  if (!row) return [];
  const where = supplyStratum ? { scopeId: row.id, supplyStratum } : { scopeId: row.id };
  return PublishedFigure.findAll({ where, order: [['median', 'ASC']] });
}

/** The one figure of a device in a stratum. */
export async function theFigure(device: MadeDevice, supplyStratum: PublishedFigure['supplyStratum']) {
  const figures = await figuresOf({ deviceId: device.id }, supplyStratum);
  if (figures.length !== 1 || !figures[0]) throw new Error(`There are ${figures.length} figures, not one.`);
  return figures[0];
}

export const historyCount = () => database().models.PublishedFigureHistory.count();

/** What differs between what is published and what follows from the reports, in one view of the database. */
export async function checkedFromScratch(): Promise<string[]> {
  const { sequelize } = database();
  const isolationLevel = Transaction.ISOLATION_LEVELS.REPEATABLE_READ;
  return sequelize.transaction({ isolationLevel }, (transaction) => checkFigures({ sequelize, transaction }));
}
