import 'server-only'
import pg from 'pg'
import { Sequelize } from 'sequelize'
import { databaseUrl } from '@/lib/config/env'
import { parseWhole } from './parse-whole'

const INT8 = 20

/** Of our own, because the driver's parsers are shared with the job queue, which wants its ids as text. */
const driver = {
  ...pg,
  types: {
    ...pg.types,
    getTypeParser: (oid: number, format?: 'text') =>
      oid === INT8 ? parseWhole : pg.types.getTypeParser(oid, format),
  },
}

function make(): Sequelize {
  return new Sequelize({
    dialect: 'postgres',
    dialectModule: driver,
    logging: false,
    timezone: '+00:00',
    pool: { max: 10, min: 0, idle: 10_000, acquire: 20_000 },
    dialectOptions: { application_name: 'brimline', keepAlive: true },
    // Read at the first connection: a build imports this file and has no settings.
    hooks: { beforeConnect: (config) => void Object.assign(config, addressOf(databaseUrl())) },
  })
}

function addressOf(url: string) {
  const { hostname, port, pathname, username, password } = new URL(url)
  return {
    host: hostname,
    port: port || '5432',
    database: decodeURIComponent(pathname.slice(1)),
    username: decodeURIComponent(username),
    password: decodeURIComponent(password),
  }
}

const kept = globalThis as { brimlineSequelize?: Sequelize }

/** The application's one pool of connections; kept through hot reloads. */
export const sequelize = (kept.brimlineSequelize ??= make())
