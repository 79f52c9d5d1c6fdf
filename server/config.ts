import path from 'node:path'
import { z } from 'zod'

const flag = z.enum(['true', 'false', '1', '0']).transform((text) => text === 'true' || text === '1')

/** Every setting of the server, read once from the environment. README lists them with their defaults. */
const settings = z.object({
  NODE_ENV: z.enum(['production', 'development', 'test']).default('development'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(8080),
  /** Loopback unless somebody decides otherwise. */
  HOST: z.string().default('127.0.0.1'),
  /** Address people reach the product at; links in e-mails begin with it. */
  PUBLIC_URL: z.url().optional(),
  DATABASE_URL: z.string().startsWith('postgres'),
  /** Owner of the tables: migrations and seeding only. */
  DATABASE_OWNER_URL: z.string().startsWith('postgres').optional(),
  /** At least 32 characters; signs access tokens, cursors and refresh tokens. */
  SESSION_SECRET: z.string().min(32),
  WEB_ROOT: z.string().optional(),
  PHOTO_ROOT: z.string().default('.local/photos'),
  /** smtp:// or smtps:// of the mail server; without it a local sink keeps messages (never in production). */
  MAIL_URL: z
    .string()
    .regex(/^smtps?:\/\//)
    .optional(),
  MAIL_FROM: z.string().default('Tallystone <no-reply@tallystone.invalid>'),
  /** Opens /dev/mail; refused in production. */
  DEV_MAIL: flag.default(false),
  /** Number of reverse proxies in front whose X-Forwarded-For is believed. */
  TRUSTED_PROXIES: z.coerce.number().int().min(0).max(5).default(0),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  /** Sign-in attempts a minute from one address. */
  SIGN_IN_RATE: z.coerce.number().int().min(1).max(10_000).default(20),
})

export interface Config {
  readonly environment: 'production' | 'development' | 'test'
  readonly port: number
  readonly host: string
  readonly publicUrl: string
  readonly databaseUrl: string
  readonly databaseOwnerUrl: string | undefined
  readonly sessionSecret: string
  readonly webRoot: string | undefined
  readonly photoRoot: string
  readonly mailUrl: string | undefined
  readonly mailFrom: string
  readonly hasDevMail: boolean
  readonly trustedProxies: number
  readonly logLevel: string
  readonly signInsPerMinute: number
}

/** A setting that cannot be used. The message names it and says what it takes. */
export class ConfigError extends Error {
  override readonly name = 'ConfigError'
}

/**
 * Reads, checks and freezes the settings.
 *
 * @throws {ConfigError} naming every setting that is wrong
 */
export function readConfig(environment: NodeJS.ProcessEnv): Config {
  const parsed = settings.safeParse(environment)
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`)
    throw new ConfigError(
      `These settings cannot be used:\n${lines.join('\n')}\nNothing was started. README.md lists every setting.`,
    )
  }
  const values = parsed.data
  if (values.NODE_ENV === 'production' && values.DEV_MAIL) {
    throw new ConfigError('DEV_MAIL cannot be used in production: it shows every message to anybody. Unset it.')
  }
  return Object.freeze({
    environment: values.NODE_ENV,
    port: values.PORT,
    host: values.HOST,
    publicUrl: (values.PUBLIC_URL ?? `http://127.0.0.1:${values.PORT}`).replace(/\/$/, ''),
    databaseUrl: values.DATABASE_URL,
    databaseOwnerUrl: values.DATABASE_OWNER_URL,
    sessionSecret: values.SESSION_SECRET,
    webRoot: values.WEB_ROOT === undefined ? undefined : path.resolve(values.WEB_ROOT),
    photoRoot: path.resolve(values.PHOTO_ROOT),
    mailUrl: values.MAIL_URL,
    mailFrom: values.MAIL_FROM,
    hasDevMail: values.DEV_MAIL,
    trustedProxies: values.TRUSTED_PROXIES,
    logLevel: values.LOG_LEVEL,
    signInsPerMinute: values.SIGN_IN_RATE,
  })
}
