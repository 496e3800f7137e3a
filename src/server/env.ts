import { z } from 'zod'

const loopbackHosts = ['127.0.0.1', 'localhost', '::1']

const port = z.coerce.number().int().min(1).max(65_535)

const databaseUrlSchema = z.url({ protocol: /^postgres(ql)?$/ })

/** A variable set to nothing is not set. */
const unsetWhenEmpty = (value: unknown) => (value === '' ? undefined : value)

const envSchema = z
  .object({
    NODE_ENV: z.enum(['development', 'production', 'test']).default('development'),
    DATABASE_URL: databaseUrlSchema,
    HOST: z.string().min(1).default('127.0.0.1'),
    PORT: port.default(3000),
    /** Where people reach the shop's Leadline; https here means a TLS front. */
    PUBLIC_URL: z.url({ protocol: /^https?$/ }).optional(),
    SESSION_SECRET: z.string().min(32),
    /** Folder for uploaded files that wait for the worker. */
    DATA_DIR: z.string().min(1),
    /** The shop's mail server; without one, mail is kept in the database and read on a page. */
    SMTP_URL: z.preprocess(unsetWhenEmpty, z.url({ protocol: /^smtps?$/ }).optional()),
    /** Whom mail comes from: an address, or `Name <address>`. */
    MAIL_FROM: z.preprocess(
      unsetWhenEmpty,
      z
        .string()
        .regex(/^(?:[^<>\p{Cc}]*<[^\s<>@]+@[^\s<>@]+>|[^\s<>@]+@[^\s<>@]+)$/u, 'no mail address')
        .optional(),
    ),
    LOG_LEVEL: z.enum(['debug', 'info', 'warn', 'error', 'silent']).default('info'),
  })
  .refine((values) => values.SMTP_URL === undefined || values.MAIL_FROM !== undefined, {
    path: ['MAIL_FROM'],
    message: 'a mail server needs it',
  })
  .transform((values) => ({
    ...values,
    mailFrom: values.MAIL_FROM ?? 'Leadline <leadline@localhost>',
    publicUrl: values.PUBLIC_URL ?? `http://${values.HOST}:${values.PORT}`,
    /** Off on plain loopback alone: anywhere else a session travels over TLS or not at all. */
    isCookieSecure: values.PUBLIC_URL?.startsWith('https:') || !loopbackHosts.includes(values.HOST),
  }))

export type Env = z.output<typeof envSchema>

/** Reads the settings, or throws one sentence that names each setting that is wrong. */
export function parseEnv(source: Record<string, string | undefined>): Env {
  const parsed = envSchema.safeParse(source)
  if (parsed.success) return parsed.data
  const faults = parsed.error.issues.map((issue) => {
    const name = issue.path.join('.')
    return source[name] === undefined ? `${name} is not set` : `${name} is wrong (${issue.message})`
  })
  throw new Error(`Settings: ${faults.join('; ')}.`)
}

let cached: Env | undefined

/** The settings of this process, read once. */
export function env(): Env {
  cached ??= parseEnv(process.env)
  return cached
}

/** The one setting of the scripts that talk to the database and do nothing else. */
export function databaseUrl(): string {
  const parsed = databaseUrlSchema.safeParse(process.env.DATABASE_URL)
  if (!parsed.success) throw new Error('Settings: DATABASE_URL is not set, or is no postgres:// address.')
  return parsed.data
}
