import { ESLint } from 'eslint';
import { describe, expect, it } from 'vitest';
import { refusal } from '@/lib/ops/lint/layers.mjs';

describe('imports go one way', () => {
  const refused: [string, string, RegExp][] = [
    ['lib/measurement/statistics/mean.ts', 'lib/platform/clock', /hand it the values/],
    ['lib/measurement/statistics/mean.ts', 'models/report', /ask a query/],
    ['app/(reader)/page.tsx', 'lib/catalogue/queries', /loaders\.ts/],
    ['app/(reader)/page.tsx', 'lib/catalogue/commands', /handlers\.ts/],
    ['app/(reader)/page.tsx', 'lib/platform/database/connection', /queries\.ts and loaders\.ts/],
    ['app/(reader)/page.tsx', 'models', /ask a query/],
    ['components/ui/button.tsx', 'lib/catalogue/schema', /move the part to components\/catalogue/],
    ['components/charts/dot-plot.tsx', 'components/figures/pile', /children or props/],
    ['components/reports/editor.tsx', 'lib/reports/loaders', /hands it props/],
    ['components/reports/editor.tsx', 'app/layout', /app is the edge/],
    ['lib/reports/schema.ts', 'lib/reports/queries', /only lib\/measurement and other schemas/],
    ['lib/reports/schema/parts.ts', 'lib/reports/queries/rows', /only lib\/measurement and other schemas/],
    ['lib/reports/policy.ts', 'lib/reports/queries', /hand it the row/],
    ['lib/reports/rules.ts', 'lib/reports/commands', /call the rule from there/],
    ['lib/reports/queries.ts', 'lib/reports/commands', /what writes goes into commands\.ts/],
    ['lib/reports/commands.ts', 'lib/reports/handlers', /call them from handlers\.ts/],
    ['lib/reports/loaders.ts', 'lib/reports/commands', /a write goes through a handler/],
    ['lib/reports/loaders.ts', 'models/report', /ask a query/],
    ['lib/reports/commands.ts', 'lib/figures/commands', /beforeCommit/],
    ['lib/claims/queries.ts', 'lib/reports/schema', /claims comes before reports/],
    ['lib/review/handlers.ts', 'lib/reports/handlers', /call its commands\.ts/],
    ['lib/reports/commands.ts', 'components/ui/button', /the page or component/],
    ['lib/platform/jobs.ts', 'lib/reports/queries', /knows no domain/],
    ['lib/reports/commands.ts', 'lib/ops/migrate', /imports nothing of lib\/ops/],
    ['lib/reports/commands.ts', 'tests/factories/members', /imports nothing of tests/],
  ];

  it.each(refused)('%s may not import %s, and is told where to go', (from, to, told) => {
    expect(refusal(from, to)).toMatch(told);
  });

  const allowed: [string, string][] = [
    ['app/(reader)/page.tsx', 'lib/catalogue/loaders'],
    ['app/api/v1/devices/route.ts', 'lib/catalogue/handlers'],
    ['components/reports/editor.tsx', 'lib/reports/schema/parts'],
    ['components/reports/editor.tsx', 'components/ui/button'],
    ['components/charts/dot-plot.tsx', 'lib/measurement/statistics/median'],
    ['lib/reports/rules.ts', 'lib/measurement/statistics/median'],
    ['lib/reports/commands.ts', 'lib/reports/queries'],
    ['lib/reports/commands.ts', 'lib/catalogue/queries'],
    ['lib/platform/http/route.ts', 'lib/auth/queries'],
    ['lib/open-data/handlers.ts', 'lib/reports/handlers'],
    ['tests/integration/any.test.ts', 'lib/reports/commands'],
    ['seeders/index.ts', 'lib/reports/commands'],
  ];

  it.each(allowed)('%s may import %s', (from, to) => {
    expect(refusal(from, to)).toBeNull();
  });

  it('takes a model’s type in commands and queries, never its class', () => {
    expect(refusal('lib/reports/commands.ts', 'models/report', { typeOnly: true })).toBeNull();
    expect(refusal('lib/reports/commands.ts', 'models/report')).toMatch(/database\(\)\.models/);
  });

  it('keeps server files out of components', () => {
    const how = { isServerOnly: () => true };
    expect(refusal('components/reports/editor.tsx', 'lib/platform/log', how)).toMatch(/hand it on as a prop/);
  });
});

describe('the linter', () => {
  const eslint = new ESLint();
  const said = async (filePath: string, text: string) => {
    const [result] = await eslint.lintText(text, { filePath });
    return (result?.messages ?? []).filter((message) => message.severity === 2).map((message) => message.message);
  };

  it('reports a planted import, relative or by alias, with the sentence that helps', async () => {
    const planted = [
      "import { database } from '@/lib/platform/database/connection';",
      "import { listDevices } from '../../lib/catalogue/queries';",
      'export const found = [database, listDevices];',
    ];
    const messages = await said('components/ui/button.tsx', planted.join('\n'));
    expect(messages).toHaveLength(2);
    expect(messages[0]).toMatch(/hand it on as a prop/);
    expect(messages[1]).toMatch(/knows no domain/);
  }, 60_000);

  it.each([
    ['lib/catalogue/queries.ts', 'export const url = process.env.DATABASE_URL;', /lib\/platform\/env\.ts/],
    ['lib/catalogue/schema.ts', "import { z } from 'zod';\nexport const n = z.coerce.number();", /parseQuantity/],
    ['lib/catalogue/queries.ts', "export const raw = (s: any) => s.literal('1');", /bind/],
    ['lib/catalogue/queries.ts', 'export const go = () => { Promise.resolve(1); };', /Promises must be awaited/],
    ['components/ui/button.tsx', 'export const A = () => <b className="text-[#ff0000]">x</b>;', /Colours are named/],
    [
      'components/ui/button.tsx',
      'export const A = () => <b dangerouslySetInnerHTML={{ __html: "" }} />;',
      /never as raw HTML/,
    ],
    ['app/layout.tsx', "'use server';\nexport const go = 1;", /no server actions/],
  ])(
    'in %s refuses %s',
    async (file, text, told) => {
      expect((await said(file, text)).join('\n')).toMatch(told);
    },
    60_000,
  );

  it('lets an address within the page be, though it looks like a colour', async () => {
    expect(await said('components/ui/button.tsx', 'export const A = () => <a href="#fade">x</a>;')).toEqual([]);
  }, 60_000);
});
