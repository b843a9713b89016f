import { rmSync, writeFileSync } from 'node:fs'
import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { DEMO_DAYS, DEMO_SIGN_INS, seedDemo } from '@/seeders/demo'
import { openDemoStage } from './support/demo-stage'

// Fills an empty sandbox with the demo, by the services as people act, before anything else runs, and names who can sign
// in. The marker file named by start stays when this is killed, so that the next start begins again.
// A seed cut short is begun again, so that no commit needs to wait for the disk.
process.env.PGOPTIONS = '-c synchronous_commit=off'
const marker = process.argv[2]

async function isEmpty() {
  const [row] = await sequelize.query<{ found: boolean }>(
    'select exists (select 1 from workshops) as found',
    {
      type: QueryTypes.SELECT,
    },
  )
  return !row?.found
}

if (await isEmpty()) {
  if (marker) writeFileSync(marker, '')
  const stage = await openDemoStage(new Date(Date.now() - DEMO_DAYS * 86_400_000))
  await seedDemo(stage)
  await stage.close()
  if (marker) rmSync(marker)
}
process.stdout.write('Demo people to sign in as, at /sandbox:\n')
for (const { email, what } of DEMO_SIGN_INS) process.stdout.write(`  ${email.padEnd(40)}${what}\n`)
await sequelize.close()
