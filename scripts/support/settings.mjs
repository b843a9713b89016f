import { randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { freePort } from './ports.mjs'
import { say, Stop } from './shell.mjs'

const DEFAULT_PORT = 3000
const SANDBOX_KEY = 'sk_test_brimline_sandbox'

/** Reads `.env` beside the project; what the environment already says wins. */
export function readEnvFile() {
  if (existsSync('.env')) process.loadEnvFile('.env')
}

/** Whether the fakes stand in: neither a payment key nor a mail server is given. */
export function wantsSandbox(given) {
  const isFilled = (name) => Boolean(given[name]) && given[name] !== SANDBOX_KEY
  if (given.SANDBOX) return given.SANDBOX === '1'
  return !isFilled('STRIPE_SECRET_KEY') && !isFilled('SMTP_URL')
}

/**
 * The environment of every child: what was given, and what this machine decides (ports, secrets made on
 * first start and kept in the data folder, the sandbox).
 */
export async function childSettings(given, { dataFolder, databaseUrl, isDev = false }) {
  const port = await webPort(given)
  const base = {
    ...given,
    NODE_ENV: isDev ? 'development' : 'production',
    NEXT_TELEMETRY_DISABLED: '1',
    PORT: String(port),
    BASE_URL: given.BASE_URL || `http://localhost:${port}`,
    DATABASE_URL: databaseUrl,
    BRIMLINE_DATA: dataFolder,
    AUTH_SECRET: given.AUTH_SECRET || keptSecrets(dataFolder).auth,
  }
  if (!wantsSandbox(given)) return base
  const [mailPort, cardPort] = [await freePort(), await freePort()]
  return {
    ...base,
    SANDBOX: '1',
    STRIPE_SECRET_KEY: given.STRIPE_SECRET_KEY || SANDBOX_KEY,
    STRIPE_WEBHOOK_SECRETS: given.STRIPE_WEBHOOK_SECRETS || keptSecrets(dataFolder).webhook,
    SMTP_URL: given.SMTP_URL || `smtp://127.0.0.1:${mailPort}`,
    CARD_PAGE_URL: given.CARD_PAGE_URL || `http://127.0.0.1:${cardPort}`,
    HOST_EMAILS: given.HOST_EMAILS || 'host@brimline.example',
  }
}

async function webPort(given) {
  const wanted = Number(given.PORT) || DEFAULT_PORT
  const found = await freePort(wanted)
  if (found === wanted) return wanted
  if (given.PORT)
    throw new Stop(`PORT ${wanted} is taken by another program. Give another one: PORT=3100 npm start`)
  say(`Port ${wanted} is taken by another program; using ${found}.`)
  return found
}

function keptSecrets(dataFolder) {
  const file = join(dataFolder, 'secrets.json')
  if (!existsSync(file)) {
    mkdirSync(dataFolder, { recursive: true })
    const made = {
      auth: randomBytes(32).toString('hex'),
      webhook: `whsec_${randomBytes(24).toString('hex')}`,
    }
    writeFileSync(file, JSON.stringify(made), { mode: 0o600 })
  }
  return JSON.parse(readFileSync(file, 'utf8'))
}
