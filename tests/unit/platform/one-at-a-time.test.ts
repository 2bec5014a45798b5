import { setTimeout as wait } from 'node:timers/promises';
import { describe, expect, it } from 'vitest';
import { oneAtATime } from '@/lib/platform/jobs/one-at-a-time';

describe('turns', () => {
  it('run one after the other, in the order in which they came', async () => {
    const takeTurn = oneAtATime(10);
    const log: string[] = [];
    const run = (name: string, ms: number) =>
      takeTurn(async () => {
        log.push(`${name} begins`);
        await wait(ms);
        log.push(`${name} ends`);
        return name;
      });
    expect(await Promise.all([run('a', 20), run('b', 1), run('c', 5)])).toEqual(['a', 'b', 'c']);
    expect(log).toEqual(['a begins', 'a ends', 'b begins', 'b ends', 'c begins', 'c ends']);
  });

  it('go on after one that failed, whose failure is its own', async () => {
    const takeTurn = oneAtATime(10);
    const failing = takeTurn(() => Promise.reject(new Error('torn')));
    const next = takeTurn(() => Promise.resolve('well'));
    await expect(failing).rejects.toThrow('torn');
    expect(await next).toBe('well');
  });

  it('beyond the line are refused at once, and taken again when it has moved', async () => {
    const takeTurn = oneAtATime(1);
    const [first, second] = [takeTurn(() => wait(20)), takeTurn(() => wait(1))];
    await expect(takeTurn(() => wait(1))).rejects.toMatchObject({ code: 'unavailable' });
    await Promise.all([first, second]);
    expect(await takeTurn(() => Promise.resolve('taken'))).toBe('taken');
  });
});
