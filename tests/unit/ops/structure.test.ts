import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { contentProblems } from '@/lib/ops/structure/contents';
import { dependencyProblems } from '@/lib/ops/structure/dependencies';
import { placeProblems } from '@/lib/ops/structure/places';
import { readSources } from '@/lib/ops/structure/sources';

let root = '';

beforeEach(() => {
  root = mkdtempSync(path.join(os.tmpdir(), 'wattcairn-structure-'));
});

afterEach(() => rmSync(root, { recursive: true, force: true }));

function plant(file: string, text = ''): void {
  mkdirSync(path.join(root, path.dirname(file)), { recursive: true });
  writeFileSync(path.join(root, file), text);
}

describe('places', () => {
  it.each([
    ['scripts/seed.ts', /top level is closed/],
    ['lib/utils/text.ts', /one of them/],
    ['lib/reports/helpers.ts', /A domain’s files are schema/],
    ['lib/reports/service/send.ts', /A domain’s files are schema/],
    ['lib/measurement/magic/guess.ts', /closed list of folders/],
    ['components/common/box.tsx', /under their domain/],
    ['components/ui/FancyBox.tsx', /lower case, with dashes/],
  ])('%s stands where nobody looks for it', (file, told) => {
    plant(file);
    const problems = placeProblems(root);
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatch(told);
  });

  it('a domain’s part is a file or a folder, not both', () => {
    plant('lib/reports/queries.ts');
    plant('lib/reports/queries/rows.ts');
    expect(placeProblems(root).join()).toMatch(/not both/);
  });

  it('what belongs there passes', () => {
    const files = ['README.md', 'lib/reports/queries/rows.ts', 'lib/auth/schema.ts', 'components/ui/box.tsx'];
    for (const file of [...files, 'app/(reader)/devices/[slug]/_components/pile.tsx']) plant(file);
    expect(placeProblems(root)).toEqual([]);
  });
});

describe('contents', () => {
  it.each([
    ['lib/reports/queries.ts', 'export const a = 1;\n', /begins with/],
    ['lib/platform/files.ts', "import { readFile } from 'node:fs/promises';\n", /begins with/],
    ['app/page.tsx', 'x\n'.repeat(81), /80 are the most/],
    ['lib/measurement/units/long.ts', 'x\n'.repeat(301), /300 are the most/],
    ['lib/reports/rules.ts', '// TODO later\n', /Do it/],
    ['lib/reports/rules.ts', '/* eslint-disable no-console */\n', /two dashes/],
    ['lib/reports/rules.ts', '// @ts-ignore\n', /narrow it/],
    ['app/form.tsx', "export async function go() {\n  'use server';\n}\n", /no server actions/],
    ['tests/unit/a.test.ts', "it.only('works', () => {});\n", /proves nothing/],
  ])('%s with %j is refused', (file, text, told) => {
    plant(file, text);
    const problems = contentProblems(readSources(root)).filter((problem) => problem.startsWith(file));
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatch(told);
  });

  it('one long file in ten is let be, two are not', () => {
    const sources = (long: number) =>
      Array.from({ length: 10 }, (_, i) => ({ file: `lib/a${i}.ts`, text: 'x\n'.repeat(i < long ? 250 : 10) }));
    expect(contentProblems(sources(1))).toEqual([]);
    expect(contentProblems(sources(2))).toHaveLength(1);
  });
});

describe('dependencies', () => {
  const floors = { packages: { next: '16.3.3' }, refusedPackages: { 'rehype-raw': 'No.' } };
  const check = (packages: Record<string, object>) => {
    plant('lib/ops/version-floors.json', JSON.stringify(floors));
    plant('package-lock.json', JSON.stringify({ packages }));
    return dependencyProblems(root).join('\n');
  };

  it('refuses a version below its floor, however deep', () => {
    expect(check({ 'node_modules/a/node_modules/next': { version: '16.3.2' } })).toMatch(/older than 16\.3\.3/);
  });

  it('takes the floor itself and what is above', () => {
    const versions = ['16.3.3', '16.10.0', '17.0.0'];
    expect(versions.map((version) => check({ 'node_modules/next': { version } }))).toEqual(['', '', '']);
  });

  it('refuses what must not come in', () => {
    expect(check({ 'node_modules/rehype-raw': { version: '7.0.0' } })).toMatch(/must not be installed/);
  });

  it('refuses a lockfile that says where a package was fetched', () => {
    const resolved = 'https://packages.example/next.tgz';
    expect(check({ 'node_modules/next': { version: '16.4.0', resolved } })).toMatch(/where next was fetched/);
  });
});
