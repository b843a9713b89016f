import { Client } from 'pg'
import { afterAll, inject } from 'vitest'

// Runs before a test file is loaded, so that the settings stand before anything reads them. The file starts on
// a database as the migrations left it, reference data included: cheaper than emptying a hundred tables.
const server = new URL(inject('serverUrl'))
const name = `file_${process.pid}_${process.env.VITEST_POOL_ID ?? '0'}_${Math.random().toString(36).slice(2, 8)}`
await onServer(`create database "${name}" template "${inject('template')}" strategy file_copy`)

const own = new URL(server)
own.pathname = `/${name}`
Object.assign(process.env, {
  DATABASE_URL: own.href,
  BASE_URL: 'http://localhost:3000',
  AUTH_SECRET: 'a secret of the tests, long enough to pass',
  STRIPE_SECRET_KEY: 'sk_test_brimline_sandbox',
  STRIPE_WEBHOOK_SECRETS: 'whsec_of_the_tests',
  CARD_PAGE_URL: 'http://127.0.0.1:3999',
  SMTP_URL: 'smtp://127.0.0.1:2599',
  HOST_EMAILS: 'host@brimline.example',
  SANDBOX: '1',
  SANDBOX_FAULTS: 'none',
  LOG_LEVEL: 'silent',
})

afterAll(async () => {
  const { sequelize } = await import('@/lib/db/sequelize')
  await sequelize.close()
  await onServer(`drop database "${name}" with (force)`)
})

async function onServer(statement: string) {
  const client = new Client({ connectionString: server.href })
  await client.connect()
  try {
    await client.query(statement)
  } finally {
    await client.end()
  }
}
