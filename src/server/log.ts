import pino from 'pino'
import { env } from './env'

/** One line of JSON an event on standard output. Line breaks in a person's input stay escaped, so no entry can be forged. */
export const log = pino({ level: env().LOG_LEVEL, base: undefined, redact: ['password', '*.password'] })
