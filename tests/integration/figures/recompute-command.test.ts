import { spawn } from 'node:child_process';
import path from 'node:path';
import { beforeEach, describe, expect, inject, it, vi } from 'vitest';
import '@/lib/figures/register';
import { database } from '@/lib/platform/database/connection';
import { aCategory, aDevice } from '../../factories/catalogue';
import { aVerifiedReport } from '../../factories/figures';
import { resetDatabase } from '../../setup/database';

const rule = vi.hoisted(() => ({ isBroken: false }));

// The planted fault: this process publishes the largest voice for the median, the program that checks does not.
vi.mock('@/lib/measurement/aggregation/publish-device', async (importOriginal) => {
  const real = await importOriginal<typeof import('@/lib/measurement/aggregation/publish-device')>();
  const publishDeviceFigure: typeof real.publishDeviceFigure = (...given) => {
    const figure = real.publishDeviceFigure(...given);
    return figure && rule.isBroken ? { ...figure, median: figure.maximum } : figure;
  };
  return { ...real, publishDeviceFigure };
});

const root = path.resolve(import.meta.dirname, '../../..');

/** Runs the program as `npm run recompute` does. */
function recompute(...args: string[]): Promise<{ code: number | null; said: string }> {
  const command = ['--conditions=react-server', '--import', 'tsx', 'lib/ops/recompute.ts', ...args];
  const env = { ...process.env, DATABASE_URL: inject('applicationUrl') };
  return new Promise((resolve, reject) => {
    const program = spawn(process.execPath, command, { cwd: root, env });
    let said = '';
    for (const stream of [program.stdout, program.stderr]) stream.on('data', (text) => (said += String(text)));
    program.once('error', reject);
    program.once('close', (code) => resolve({ code, said }));
  });
}

beforeEach(async () => {
  rule.isBroken = false;
  await resetDatabase();
});

describe('npm run recompute -- --check', () => {
  it('says so and ends with 0 where everything is equal', async () => {
    await aVerifiedReport(await aDevice(await aCategory()), [{ value: 8 }]);
    const { code, said } = await recompute('--check');
    expect(said).toContain('4 published figures equal a recomputation');
    expect(code).toBe(0);
  });

  it('prints each difference, ends with 1 and repairs nothing; without --check it repairs', async () => {
    await aVerifiedReport(await aDevice(await aCategory()), [{ value: 8 }]);
    await database().models.PublishedFigure.update({ n: 2 }, { where: { supplyStratum: 'ac-any' } });
    const checked = await recompute('--check');
    expect(checked.said.match(/n: 2 is stored, 1 follows from the reports/g)).toHaveLength(2);
    expect(checked.code).toBe(1);
    expect(await recompute()).toMatchObject({
      code: 0,
      said: expect.stringContaining('2 published figures') as string,
    });
    expect(await recompute('--check')).toMatchObject({ code: 0 });
  });

  it('finds what a broken publishing rule has published', async () => {
    const device = await aDevice(await aCategory());
    await aVerifiedReport(device, [{ value: 8 }]);
    rule.isBroken = true;
    await aVerifiedReport(device, [{ value: 10 }]);
    const { code, said } = await recompute('--check');
    expect(said).toContain('median: 10 is stored, 9 follows from the reports');
    expect(code).toBe(1);
  });
});
