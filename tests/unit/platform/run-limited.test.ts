import { describe, expect, it } from 'vitest';
import { runLimited } from '@/lib/platform/jobs/run-limited';

const program = (code: string) => ['--input-type=module', '--eval', code];

describe('a program in a process of its own', () => {
  it('reads what it is given and gives back what it prints', async () => {
    const code = 'process.stdin.on("data", (d) => process.stdout.write(String(d).toUpperCase()))';
    expect(await runLimited({ args: program(code), input: 'watts', mostMs: 10_000 })).toBe('WATTS');
  });

  it('knows nothing of the server’s environment', async () => {
    const printed = await runLimited({
      args: program('process.stdout.write(JSON.stringify(process.env))'),
      mostMs: 10_000,
    });
    expect(Object.keys(JSON.parse(printed) as object).sort()).toEqual(
      expect.not.arrayContaining(['DATABASE_URL', 'NEXTAUTH_SECRET', 'HOME']),
    );
  });

  it('that fails tells why', async () => {
    const failed = runLimited({ args: program('throw new Error("no such picture")'), mostMs: 10_000 });
    await expect(failed).rejects.toThrow('no such picture');
  });

  it('that never ends is stopped', async () => {
    await expect(runLimited({ args: program('for (;;);'), mostMs: 300 })).rejects.toThrow('SIGKILL');
  });

  it('that wants more memory than it may have ends, and this one goes on', async () => {
    const code = 'const all = []; for (;;) all.push(Buffer.alloc(50e6, 1));';
    const failed = runLimited({ args: program(code), mostAddressKb: 2_000_000, mostMs: 20_000 });
    await expect(failed).rejects.toThrow(/it ended with/);
  });

  it('that prints without end is stopped', async () => {
    const code = 'const x = "x".repeat(1e6); const w = () => process.stdout.write(x, w); w();';
    await expect(runLimited({ args: program(code), mostMs: 20_000 })).rejects.toThrow('SIGKILL');
  });
});
