import { readdirSync } from 'node:fs';
import path from 'node:path';
import { DOMAIN_FILES, DOMAINS } from '../lint/layers.mjs';
import { filesUnder } from './sources';

const TOP_LEVEL = [
  ...['app', 'components', 'lib', 'models', 'migrations', 'seeders', 'uploads', 'public', 'tests'],
  ...['README.md', 'DEVELOPERS.md', 'LICENSE', 'package.json', 'package-lock.json', 'tsconfig.json'],
  // Tools insist on these at the root.
  ...['next.config.mjs', 'tailwind.config.ts', 'postcss.config.mjs', 'eslint.config.mjs', 'vitest.config.ts'],
  ...['playwright.config.ts', 'stryker.config.mjs', 'instrumentation.ts'],
];
/** Made by tools, and ignored by git. */
const MADE = ['node_modules', 'next-env.d.ts', 'tsconfig.tsbuildinfo', 'coverage', 'test-results', 'playwright-report'];

const IN_LIB = [...DOMAINS, 'measurement', 'platform', 'ops'];
const IN_MEASUREMENT = [
  ...['units', 'traces', 'phases', 'uncertainty', 'statistics', 'aggregation', 'claims', 'contrast', 'energy'],
  ...['supply', 'rule-version.ts'],
];
const IN_COMPONENTS = ['ui', 'layout', 'charts', 'catalogue', 'reports', 'review', 'figures', 'claims', 'articles'];
const MORE_COMPONENTS = ['household', 'account'];

/** What stands where nobody would look for it. */
export function placeProblems(root: string): string[] {
  const listed = (folder: string) => {
    try {
      return readdirSync(path.join(root, folder));
    } catch {
      return [];
    }
  };
  const unknown = (folder: string, known: string[], advice: string) =>
    listed(folder)
      .filter((name) => !known.includes(name))
      .map((name) => `${path.posix.join(folder, name)}: ${advice}`);
  return [
    ...unknown('.', [...TOP_LEVEL, ...MADE, ...listed('.').filter((name) => name.startsWith('.'))], TOP_ADVICE),
    ...unknown('lib', IN_LIB, 'lib holds the domains, measurement, platform and ops; put this into one of them.'),
    ...unknown(
      'lib/measurement',
      IN_MEASUREMENT,
      'lib/measurement has a closed list of folders (structure/places.ts).',
    ),
    ...unknown(
      'components',
      [...IN_COMPONENTS, ...MORE_COMPONENTS],
      'Components stand in ui, layout, charts, or under their domain.',
    ),
    ...DOMAINS.flatMap((domain) => domainProblems(domain, listed(`lib/${domain}`))),
    ...nameProblems(root),
  ];
}

const TOP_ADVICE = 'The top level is closed: a program goes into lib/ops, a helper into the domain that uses it.';

function domainProblems(domain: string, names: string[]): string[] {
  const kinds = names.map((name) => name.replace(/\.tsx?$/, ''));
  const strange = names.filter((name, i) => !DOMAIN_FILES.includes(kinds[i] ?? ''));
  const twice = names.filter((name) => name.endsWith('.ts') && names.includes(name.slice(0, -'.ts'.length)));
  return [
    ...strange.map(
      (name) => `lib/${domain}/${name}: A domain’s files are ${DOMAIN_FILES.join(', ')}, each a file or a folder.`,
    ),
    ...twice.map((name) => `lib/${domain}/${name}: It is a file or a folder, not both.`),
  ];
}

/** Next’s own marks, [slug], (group) and _components, aside. */
function nameProblems(root: string): string[] {
  const folders = ['app', 'components', 'lib', 'models', 'migrations', 'seeders', 'tests'];
  const kebab = /^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9-]+)*$/;
  return folders
    .flatMap((folder) => filesUnder(root, folder))
    .filter((file) => !file.startsWith('tests/fixtures/') && !file.startsWith('tests/reference/'))
    .filter((file) => file.split('/').some((part) => !kebab.test(part.replace(/^_|[[\]().]/g, '') || 'x')))
    .map((file) => `${file}: Files and folders are named in lower case, with dashes.`);
}
