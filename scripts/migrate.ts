import { databaseUrl } from '@/lib/config/env'
import { sequelize } from '@/lib/db/sequelize'
import { seedReference } from '@/seeders/reference'
import { migrateDown, migrateUp } from './support/migrations'

// node scripts/run.mjs scripts/migrate.ts           brings the database at DATABASE_URL up to date, reference data included
// node scripts/run.mjs scripts/migrate.ts down 2    takes the newest two files back
const [direction = 'up', count = '1'] = process.argv.slice(2)
const say = (line: string) => process.stdout.write(`${line}\n`)

try {
  if (direction === 'down') await migrateDown(databaseUrl(), Number(count), { say })
  else {
    await migrateUp(databaseUrl(), { say })
    await seedReference()
  }
} catch (error) {
  const { message, where } = error as Error & { where?: string }
  process.stderr.write(`${[message, where].filter(Boolean).join('\n')}\n`)
  process.exit(1)
}
await sequelize.close()
