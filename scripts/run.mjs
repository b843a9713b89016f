import { spawn } from 'node:child_process'
import { fileURLToPath } from 'node:url'

// Runs a TypeScript script with the project's paths. The child is the script itself: signals go to it and its
// end is ours.
const [script, ...args] = process.argv.slice(2)
if (!script) {
  process.stderr.write('node scripts/run.mjs <script.ts> [arguments]\n')
  process.exit(1)
}
const tsconfig = fileURLToPath(new URL('../tsconfig.scripts.json', import.meta.url))
const child = spawn(process.execPath, ['--import', 'tsx', script, ...args], {
  stdio: 'inherit',
  env: { ...process.env, TSX_TSCONFIG_PATH: tsconfig },
})
for (const signal of ['SIGTERM', 'SIGINT']) process.on(signal, () => child.kill(signal))
child.on('exit', (code, signal) => {
  if (!signal) process.exit(code ?? 1)
  process.removeAllListeners(signal)
  process.kill(process.pid, signal)
})
