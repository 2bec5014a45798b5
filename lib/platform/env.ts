import 'server-only';
import { z } from 'zod';

const flag = z
  .enum(['0', '1'])
  .default('0')
  .transform((text) => text === '1');

const schema = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test']).default('development'),
  DATABASE_URL: z.string().startsWith('postgres'),
  PORT: z
    .string()
    .regex(/^\d{1,5}$/)
    .default('3000'),
  PUBLIC_ORIGIN: z.url().optional(),
  NEXTAUTH_SECRET: z.string().min(32, 'at least 32 characters: make one with `openssl rand -base64 48`'),
  SMTP_URL: z.string().optional(),
  MAIL_FROM: z.string().default('Wattcairn <notices@wattcairn.invalid>'),
  UPLOADS_DIR: z.string().optional(),
  // The folder in which the demonstration's mail catcher keeps what it caught.
  CAUGHT_MAIL_DIR: z.string().optional(),
  DEMO: flag,
  TRUST_PROXY: flag,
  // Moves the clock, so that a test can let a session or a link expire.
  CLOCK_OFFSET_SECONDS: z
    .string()
    .regex(/^-?\d+$/)
    .default('0'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
});

export interface Environment {
  production: boolean;
  databaseUrl: string;
  port: number;
  publicOrigin: string;
  secret: string;
  smtpUrl: string | null;
  mailFrom: string;
  uploadsDirectory: string;
  caughtMailDirectory: string | null;
  demonstration: boolean;
  trustProxy: boolean;
  clockOffsetSeconds: number;
  logLevel: z.infer<typeof schema>['LOG_LEVEL'];
}

let known: Environment | undefined;

/**
 * The settings, read and checked once. Read lazily, because a build must not need a database.
 * @throws {Error} naming each variable that is missing or wrong, and what it should be.
 */
export function env(): Environment {
  if (known) return known;
  const result = schema.safeParse(process.env);
  if (!result.success) {
    const lines = result.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The environment is not complete. Set these and start again:\n${lines.join('\n')}`);
  }
  const raw = result.data;
  known = {
    production: raw.NODE_ENV === 'production',
    databaseUrl: raw.DATABASE_URL,
    port: Number(raw.PORT),
    publicOrigin: new URL(raw.PUBLIC_ORIGIN ?? `http://127.0.0.1:${raw.PORT}`).origin,
    secret: raw.NEXTAUTH_SECRET,
    smtpUrl: raw.SMTP_URL ?? null,
    mailFrom: raw.MAIL_FROM,
    uploadsDirectory: raw.UPLOADS_DIR ?? `${process.cwd()}/uploads`,
    caughtMailDirectory: raw.CAUGHT_MAIL_DIR ?? null,
    demonstration: raw.DEMO,
    trustProxy: raw.TRUST_PROXY,
    clockOffsetSeconds: Number(raw.CLOCK_OFFSET_SECONDS),
    logLevel: raw.LOG_LEVEL,
  };
  return known;
}

/** Whether this is the demonstration, known without the other settings: pages made by the build need it too. */
export function runsAsDemonstration(): boolean {
  return process.env.DEMO === '1';
}
