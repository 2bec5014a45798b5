import type { Source } from './sources';

const MOST_LINES = 300;
const MOST_PAGE_LINES = 80;
const USUAL_LINES = 200;
const SERVER_KINDS = /^lib\/[a-z-]+\/(queries|commands|loaders|handlers|register)(\.ts$|\/)/;
const SERVER_ONLY = "import 'server-only';";

/** What a file holds that it must not, or lacks. */
export function contentProblems(sources: Source[]): string[] {
  const written = sources.filter(({ file }) => !file.startsWith('tests/fixtures/'));
  return [...written.flatMap(lengthProblems), ...usualLength(written), ...written.flatMap(textProblems)];
}

function lengthProblems({ file, text }: Source): string[] {
  const lines = text.split('\n').length - 1;
  const most = file.endsWith('/page.tsx') ? MOST_PAGE_LINES : MOST_LINES;
  return lines > most ? [`${file}: ${lines} lines; ${most} are the most. Move a part of it to a file of its own.`] : [];
}

/** Nine in ten are short: a hundred files of 299 lines would pass the limit and miss its point. */
function usualLength(sources: Source[]): string[] {
  const long = sources.filter(({ text }) => text.split('\n').length - 1 > USUAL_LINES);
  if (long.length * 10 <= sources.length) return [];
  return [`${long.length} of ${sources.length} files have more than ${USUAL_LINES} lines; one in ten may.`];
}

const FORBIDDEN: { pattern: RegExp; where: RegExp; advice: string }[] = [
  {
    pattern: /^\s*['"]use server['"]/m,
    where: /^(app|components|lib)\//,
    advice: 'There are no server actions: make a handler with defineRoute.',
  },
  { pattern: /\b(TODO|FIXME|XXX)\b/, where: /./, advice: 'Do it, or file it where the work is planned.' },
  {
    pattern: /\b(it|test|describe)\.(only|skip|todo)\b/,
    where: /^tests\/.*\.test\.tsx?$|^tests\/e2e\//,
    advice: 'A test that doesn’t run proves nothing.',
  },
  {
    pattern: /eslint-disable(?!.*--)/,
    where: /./,
    advice: 'A rule that is turned off says why, behind two dashes.',
  },
  { pattern: /@ts-(ignore|nocheck)/, where: /./, advice: 'Give the type, or narrow it.' },
  {
    pattern: /\bregistry\.[a-z-]+\.(org|com|io)\b|\bdeb\.[a-z-]+\.org\b/,
    where: /./,
    advice: 'Where packages come from is the machine’s affair.',
  },
];

function textProblems({ file, text }: Source): string[] {
  if (file.startsWith('lib/ops/structure/') || file.startsWith('tests/unit/ops/')) return [];
  const found = FORBIDDEN.filter(({ pattern, where }) => where.test(file) && pattern.test(text));
  const problems = found.map(({ advice }) => `${file}: ${advice}`);
  const onServer = SERVER_KINDS.test(file) || (file.startsWith('lib/platform/') && reachesOut(text));
  if (onServer && file.endsWith('.ts') && !text.startsWith(SERVER_ONLY)) {
    problems.push(`${file}: A server file begins with ${SERVER_ONLY}`);
  }
  return problems;
}

/** Whether a browser could not run it, or must not. */
const reachesOut = (text: string) =>
  /^import (?!type\b)[^;]* from '(node:|sequelize|pg|nodemailer|pino|next\/headers|next\/cache|@\/models)/m.test(text);
