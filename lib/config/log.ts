import { pino } from 'pino'
import { env } from '@/lib/config/env'

/** Names under which personal data, secrets and card data travel; they never reach a log line. */
const SECRET = [
  'email',
  'to',
  'address',
  'name',
  'phone',
  'token',
  'password',
  'secret',
  'cookie',
  'authorization',
  'html',
  'text',
  'props',
]

/** Writes one line of JSON per event: ids and counts, never people. */
export function log() {
  made ??= pino({
    level: env().LOG_LEVEL,
    base: null,
    timestamp: pino.stdTimeFunctions.isoTime,
    redact: { paths: SECRET.flatMap((name) => [name, `*.${name}`, `*.*.${name}`]), censor: '[kept back]' },
    serializers: { error: pino.stdSerializers.err },
  })
  return made
}

let made: pino.Logger | undefined
