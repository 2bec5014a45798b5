import 'server-only';
import { Transaction } from 'sequelize';
import { currentContext } from '../context';
import { database, type Database } from './connection';

/** A device or a category whose published figures a command may have changed. */
export interface TouchedScope {
  kind: 'device' | 'category';
  id: number;
}

/** One unit of work: everything a command does, committed together or not at all. */
export interface Work extends Database {
  transaction: Transaction;
  /** Marks figures for recomputation in this very transaction. */
  touch: (scope: TouchedScope) => void;
  touched: readonly TouchedScope[];
  /** Marks a cache tag as stale once the commit is through. */
  dropTag: (tag: string) => void;
  /** The last event that was recorded here: what a moved figure's history names as its cause. */
  eventId: string | null;
}

type BeforeCommit = (work: Work) => Promise<void>;

const key = Symbol.for('wattcairn.before-commit');
const holder = globalThis as unknown as Record<symbol, Map<string, BeforeCommit> | undefined>;
const hooks = (holder[key] ??= new Map<string, BeforeCommit>());

/**
 * Registers what must run before each commit, by name: how a later domain (figures) follows an earlier one (reports)
 * without being imported by it. Registering a name again replaces it.
 */
export function beforeCommit(name: string, run: BeforeCommit): void {
  hooks.set(name, run);
}

const RETRIED = new Set(['40001', '40P01']);
const MOST_TRIES = 4;

/**
 * Runs a command's writes in one transaction. Serialisation failures and deadlocks are tried again with a clean slate.
 * Cache tags marked as stale reach the request's context only after the commit.
 * @throws {Error} when figures were touched and nothing is registered that recomputes them.
 */
export async function inTransaction<T>(run: (work: Work) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await once(run);
    } catch (error) {
      if (attempt >= MOST_TRIES || !RETRIED.has(sqlState(error))) throw error;
      await new Promise((resolve) => setTimeout(resolve, 20 * attempt * (1 + Math.random())));
    }
  }
}

async function once<T>(run: (work: Work) => Promise<T>): Promise<T> {
  const { sequelize, models } = database();
  const touched: TouchedScope[] = [];
  const tags = new Set<string>();
  const isolationLevel = Transaction.ISOLATION_LEVELS.READ_COMMITTED;
  const result = await sequelize.transaction({ isolationLevel }, async (transaction) => {
    const work: Work = {
      sequelize,
      models,
      transaction,
      touched,
      touch: (scope) => {
        if (!touched.some((known) => known.kind === scope.kind && known.id === scope.id)) touched.push(scope);
      },
      dropTag: (tag) => tags.add(tag),
      eventId: null,
    };
    const answer = await run(work);
    if (touched.length > 0 && hooks.size === 0) {
      throw new Error('Figures were touched, but nothing is registered that recomputes them.');
    }
    for (const hook of hooks.values()) await hook(work);
    return answer;
  });
  const context = currentContext();
  if (context) for (const tag of tags) context.staleTags.add(tag);
  return result;
}

/** PostgreSQL's five-character error code, or an empty string. */
export function sqlState(error: unknown): string {
  const original = (error as { original?: unknown } | null)?.original ?? error;
  const code = (original as { code?: unknown } | null)?.code;
  return typeof code === 'string' ? code : '';
}

/** The name of the constraint that refused a write, or null. */
export function brokenConstraint(error: unknown): string | null {
  const original = (error as { original?: unknown } | null)?.original;
  const name = (original as { constraint?: unknown } | null)?.constraint;
  return typeof name === 'string' ? name : null;
}
