import { mkdir, readFile, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/lib/platform/database/connection';
import { env } from '@/lib/platform/env';
import { keptPath, storedName, writeKept } from '@/lib/platform/storage/files';
import { acceptPhoto } from '@/lib/reports/commands/photos';
import { sweepUploads } from '@/lib/reports/commands/sweep-uploads';
import { acceptTrace } from '@/lib/reports/commands/traces';
import { aMember, type MadeMember } from '../../factories/members';
import { aJpeg } from '../../factories/pictures';
import { aLog, aTrace, received } from '../../factories/reports';
import { emptyUploads, filesIn } from '../../factories/uploads-folder';
import { asOwner, resetDatabase } from '../../setup/database';

let member: MadeMember;

beforeEach(async () => {
  await resetDatabase();
  await emptyUploads();
  member = await aMember();
});

const inFolder = (...parts: string[]) => path.join(env().uploadsDirectory, ...parts);

describe('the sweep at a start', () => {
  it('makes the folders where there are none', async () => {
    await sweepUploads();
    expect([await filesIn('incoming'), await filesIn('kept'), await filesIn('lost-and-found')]).toEqual([[], [], []]);
  });

  it('empties what was being received, sets aside what no row names, and leaves the rest', async () => {
    await aTrace(
      member,
      aLog(600, () => 8),
    );
    await acceptPhoto(member.id, await received(await aJpeg(), 'a.jpg'));
    const named = (await filesIn('kept')).sort();
    expect(named).toHaveLength(4);
    await received('half a file', 'a.csv');
    const stray = storedName('log');
    await writeKept(stray, Buffer.from('of a process that was killed before its commit'));
    await writeFile(inFolder('kept', 'a note of the admin.txt'), 'read me');
    await sweepUploads();
    expect((await filesIn('kept')).sort()).toEqual(named);
    expect(await filesIn('incoming')).toEqual([]);
    expect((await filesIn('lost-and-found')).sort()).toEqual([stray, 'a note of the admin.txt'].sort());
    expect(await readFile(inFolder('lost-and-found', stray), 'utf8')).toMatch(/killed/);
  });

  it('stays where the database can’t be asked: nothing is moved on a guess', async () => {
    await aTrace(
      member,
      aLog(600, () => 8),
    );
    const before = (await filesIn('kept')).sort();
    await asOwner((client) => client.query('alter table trace rename to trace_elsewhere'));
    await expect(sweepUploads()).rejects.toThrow();
    await asOwner((client) => client.query('alter table trace_elsewhere rename to trace'));
    expect((await filesIn('kept')).sort()).toEqual(before);
  });
});

describe('a failure between the file and its row', () => {
  it('takes the file back: of a log, of its series and of a photo', async () => {
    const upload = await received(
      aLog(600, () => 8),
      'log.csv',
    );
    const picture = await received(await aJpeg(), 'a.jpg');
    const options = { zone: 'UTC', corrections: {} };
    await asOwner((client) => client.query('alter table trace add constraint no_more check (false) not valid'));
    await expect(acceptTrace(member.id, upload, options)).rejects.toThrow();
    await asOwner((client) => client.query('alter table trace drop constraint no_more'));
    // The file as it came has its row by then, and can be read again.
    expect(await filesIn('kept')).toHaveLength(1);
    expect(await database().models.TraceUpload.count()).toBe(1);
    await asOwner((client) => client.query('alter table attachment add constraint no_more check (false) not valid'));
    await expect(acceptPhoto(member.id, picture)).rejects.toThrow();
    await asOwner((client) => client.query('alter table attachment drop constraint no_more'));
    expect(await filesIn('kept')).toHaveLength(1);
    expect(await filesIn('incoming')).toEqual([]);
  });
});

describe('a stored name', () => {
  it.each(['../../etc/passwd', 'a.log', '', `${'a'.repeat(43)}.log/..`, `${'a'.repeat(43)}.log\0`])(
    'of another shape than ours (%j) leads nowhere',
    async (name) => {
      await mkdir(inFolder('kept'), { recursive: true });
      expect(() => keptPath(name)).toThrow(/another shape/);
    },
  );
});
