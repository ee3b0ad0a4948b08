import { z } from 'zod';

const flag = z.enum(['true', 'false', '1', '0']).transform((value) => value === 'true' || value === '1');

const Settings = z
  .object({
    NODE_ENV: z.enum(['development', 'production', 'test']).default('development'),
    HOST: z.string().default('127.0.0.1'),
    PORT: z.coerce.number().int().min(0).max(65535).default(4310),
    /** What stands in mails and in structured data; https here makes cookies Secure. */
    PUBLIC_ADDRESS: z.url({ protocol: /^https?$/ }).default('http://localhost:4310'),
    DATABASE_URL: z.url({ protocol: /^(mysql|mariadb)$/, hostname: /.+/ }),
    MEILI_HOST: z.url({ protocol: /^https?$/ }),
    MEILI_KEY: z.string().optional(),
    /** Name of the index of write-ups; another one for each test, so that they do not meet. */
    SEARCH_INDEX: z
      .string()
      .regex(/^[a-zA-Z0-9_-]{1,100}$/, 'takes letters, digits, hyphens and underscores')
      .default('write-ups'),
    SMTP_URL: z.url({ protocol: /^smtps?$/, hostname: /.+/ }),
    MAIL_FROM: z.string().default('Shimlore <desk@shimlore.example>'),
    /** Signs the addresses mail comes back to, and opens the hook at which the mail server hands it in. */
    BOUNCE_SECRET: z.string().min(32, 'needs at least 32 characters').optional(),
    PHOTO_DIR: z.string().default('data/photos'),
    /** Folder of the dump of published knowledge. */
    DUMP_DIR: z.string().default('data/dump'),
    /** Folder of the built client; where it is not built, only the API is served. */
    WEB_DIR: z.string().default('dist/web'),
    SESSION_SECRET: z.string().min(32, 'needs at least 32 characters'),
    LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
    /** Whether X-Forwarded-* headers of a proxy in front are believed. */
    TRUST_PROXY: flag.default(false),
    /** Page of the local mailbox; only set where the local fake catches mail. */
    MAILBOX_URL: z.url().optional(),
  })
  // Nothing here speaks TLS itself, so https means a proxy; unless its word is taken, no Secure cookie would ever be set.
  .refine((settings) => settings.TRUST_PROXY || !settings.PUBLIC_ADDRESS.startsWith('https:'), {
    path: ['TRUST_PROXY'],
    message: 'has to be true where PUBLIC_ADDRESS begins with https',
  });
export type Settings = z.infer<typeof Settings>;

/**
 * Settings from the environment. Throws one sentence for each that is missing or off, naming the variable,
 * so that a wrong setting ends the start instead of a request.
 */
export function readSettings(environment: Record<string, string | undefined>): Settings {
  const parsed = Settings.safeParse(environment);
  if (parsed.success) return parsed.data;
  const lines = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
  throw new Error(
    `These settings cannot be used:\n  ${lines.join('\n  ')}\nThe table in README.md says what each takes.`,
  );
}
