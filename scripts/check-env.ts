import { checkEnv } from '@/lib/config/env'

// Names every missing or wrong setting in a sentence; ends with 1 when there is one.
const problems = checkEnv()
for (const sentence of problems) process.stdout.write(`${sentence}\n`)
process.exitCode = problems.length > 0 ? 1 : 0
