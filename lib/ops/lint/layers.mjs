import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

/** The domains in their order: a later one may import an earlier one. */
export const DOMAINS = [
  'auth',
  'members',
  'catalogue',
  'claims',
  'reports',
  'review',
  'figures',
  'articles',
  'household',
  'notices',
  'open-data',
];

/** The closed vocabulary of a domain's files, and what each may import of the domains. */
const MAY_IMPORT = {
  schema: ['schema'],
  policy: ['schema', 'policy'],
  rules: ['schema', 'policy', 'rules'],
  presenter: ['schema', 'rules', 'presenter'],
  queries: ['schema', 'policy', 'rules', 'presenter', 'queries'],
  commands: ['schema', 'policy', 'rules', 'presenter', 'queries', 'commands'],
  loaders: ['schema', 'policy', 'rules', 'presenter', 'queries', 'loaders'],
  handlers: ['schema', 'policy', 'rules', 'presenter', 'queries', 'commands', 'handlers', 'register'],
  register: ['commands', 'register'],
};
export const DOMAIN_FILES = Object.keys(MAY_IMPORT);

const GOES = {
  schema: 'A schema says what comes in and goes out: it knows only lib/measurement and other schemas.',
  policy: 'A policy is a small predicate over a row: hand it the row instead.',
  rules:
    'Rules decide from what they are handed: read in queries.ts, write in commands.ts and call the rule from there.',
  presenter: 'A presenter names the fields that leave: read in queries.ts and hand it the rows.',
  queries: 'Queries read: what writes goes into commands.ts, what a page needs into loaders.ts.',
  commands: 'Commands know nothing of pages and requests: call them from handlers.ts.',
  loaders: 'Loaders read for pages: ask queries.ts for it; a write goes through a handler.',
  handlers: 'Handlers call commands.ts and queries.ts: move what this needs there.',
  register: 'Register only names the commands that run before a commit: put the work into commands.ts.',
};

const BOUND = ['app', 'components', 'lib', 'models', 'migrations'];

/** @param {string} file from the project's root, with slashes. */
function place(file) {
  const [area = '', second = '', third = ''] = file.split('/');
  const layer = area === 'lib' ? (DOMAINS.includes(second) ? 'domain' : second) : area;
  return { file, area, layer, second, kind: layer === 'domain' ? third.replace(/\.tsx?$/, '') : '' };
}

/**
 * Why one file may not import another, and where the code should go; null where it may.
 * @param {string} from
 * @param {string} to both from the project's root, with slashes.
 * @param {{ typeOnly?: boolean, isServerOnly?: (file: string) => boolean }} how
 * @returns {string | null}
 */
export function refusal(from, to, { typeOnly = false, isServerOnly = () => false } = {}) {
  const source = place(from);
  const target = place(to);
  // Tests, seeders, programs, and the settings files at the root may import what they need.
  if (!BOUND.includes(source.area) || source.layer === 'ops') return null;
  if (['tests', 'seeders'].includes(target.area) || target.layer === 'ops') {
    return `What the site runs imports nothing of ${target.area === 'lib' ? 'lib/ops' : target.area}: move what both need into lib/platform or a domain.`;
  }
  if (target.area === 'models' && source.area !== 'models') return refuseModel(source, typeOnly);
  if (target.area === 'app' && source.area !== 'app') {
    return 'app is the edge: move what both need into components or a domain.';
  }
  if (source.layer === 'measurement' && target.layer !== 'measurement') {
    return 'lib/measurement is pure and imports nothing of the project: hand it the values, and do the reading in a domain.';
  }
  if (source.area === 'components') return refuseForComponent(source, target, isServerOnly(to));
  if (target.area === 'components' && source.area !== 'app') {
    return 'lib knows no components: the page or component that shows this imports both.';
  }
  if (source.area === 'app') return refuseForApp(target);
  if (source.layer === 'platform' && target.layer === 'domain') return refuseForPlatform(source, target);
  if (source.layer === 'domain' && target.layer === 'domain') return refuseForDomain(source, target);
  return null;
}

function refuseModel(source, typeOnly) {
  const mayName = source.layer === 'platform' || ['queries', 'commands'].includes(source.kind);
  if (source.file === 'lib/platform/database/connection.ts') return null;
  if (!mayName && source.second !== 'auth') {
    return 'Only queries.ts and commands.ts (and lib/auth) know the tables: ask a query for plain objects.';
  }
  if (typeOnly) return null;
  return 'Import a model’s type only and take the class from database().models or work.models: the bundler makes two copies of the file, and only one of them is connected.';
}

function refuseForApp(target) {
  if (target.layer === 'domain' && ['queries', 'commands', 'presenter', 'register'].includes(target.kind)) {
    return 'A page asks its domain’s loaders.ts, a route file names its handlers.ts: put this there.';
  }
  if (target.file.startsWith('lib/platform/database')) {
    return 'A page or route never reaches the database itself: put this into the domain’s queries.ts and loaders.ts.';
  }
  return null;
}

function refuseForComponent(source, target, serverOnly) {
  const ofADomain = !['ui', 'layout', 'charts'].includes(source.second);
  if (target.area === 'components') {
    if (ofADomain || ['ui', 'layout', 'charts'].includes(target.second)) return null;
    return `components/${source.second} knows no domain: pass this in as children or props from the page, or move the part to components/${target.second}.`;
  }
  if (target.layer === 'domain') {
    if (!ofADomain) {
      return `components/${source.second} knows no domain: take plain props, or move the part to components/${target.second}.`;
    }
    if (['schema', 'policy', 'rules'].includes(target.kind)) return null;
    return 'A component imports of a domain only schema, policy and rules: the page reads (loaders.ts) and hands it props, or it fetches from /api/v1.';
  }
  if (serverOnly) return 'A component may come to run in the browser: let the page read this and hand it on as a prop.';
  return null;
}

function refuseForPlatform(source, target) {
  // The one way back, and why, is among the decisions in DEVELOPERS.md.
  if (source.file.startsWith('lib/platform/http/') && target.second === 'auth') return null;
  return 'lib/platform knows no domain: let the domain call it and hand it what it needs.';
}

function refuseForDomain(source, target) {
  const [here, there] = [DOMAINS.indexOf(source.second), DOMAINS.indexOf(target.second)];
  if (here < there) {
    return `${source.second} comes before ${target.second}: move this into ${target.second}, or register it there with beforeCommit (lib/platform/database/transaction.ts).`;
  }
  if (target.kind === 'handlers' && here !== there && source.second !== 'open-data') {
    return 'Another domain’s handlers answer requests: call its commands.ts or queries.ts.';
  }
  // Signing in reads and prolongs a session in one.
  if (source.second === 'auth' && source.kind === 'queries' && target.kind === 'commands') return null;
  const allowed = MAY_IMPORT[source.kind];
  return !allowed || allowed.includes(target.kind) ? null : (GOES[source.kind] ?? null);
}

/** @param {string} root */
export function serverOnlyIn(root) {
  return (/** @type {string} */ file) => {
    const place = ['', '.ts', '.tsx', '/index.ts'].map((end) => path.join(root, file + end)).find((p) => isFile(p));
    return place !== undefined && readFileSync(place, 'utf8').startsWith("import 'server-only'");
  };
}

const isFile = (place) => existsSync(place) && path.extname(place) !== '';
