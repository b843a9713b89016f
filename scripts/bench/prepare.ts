import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { sequelize } from '@/lib/db/sequelize'
import { designModule } from '@/seeders/demo/acts/design-module'
import { foundWorkshop } from '@/seeders/demo/acts/found-workshop'
import { ROWLOCK } from '@/seeders/demo/hollow-pier/rowlock'
import { HOLLOW_PIER } from '@/seeders/demo/hollow-pier/workshop'
import { openDemoStage } from '../support/demo-stage'

// One workshop with one published module, made as the demo makes them.
const stage = await openDemoStage(new Date(Date.now() - 86_400_000))
const house = await foundWorkshop(stage, HOLLOW_PIER)
await designModule(stage, house, ROWLOCK)
await stage.goTo(new Date())
await stage.close()
await closeSandboxPool()
await sequelize.close()
