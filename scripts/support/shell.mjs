import { spawn } from 'node:child_process'

/** One plain progress line. */
export function say(sentence) {
  process.stdout.write(`${sentence}\n`)
}

/** A failure that needs a sentence, not a stack: the commands print it and end with 1. */
export class Stop extends Error {}

/**
 * Runs a program to its end and gives back what it printed. A failing one throws with its last lines.
 * `show` lets its output through as it comes.
 */
export function run(command, args, { show = false, allowFailure = false, input, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      stdio: [input === undefined ? 'ignore' : 'pipe', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe'],
      ...options,
    })
    // Whoever is told to stop in the middle takes the program along.
    const end = () => child.kill()
    process.once('exit', end)
    child.on('close', () => process.off('exit', end))
    let output = ''
    child.stdout?.on('data', (chunk) => (output += chunk))
    child.stderr?.on('data', (chunk) => (output += chunk))
    if (input !== undefined) child.stdin.end(input)
    child.on('error', reject)
    child.on('close', (code, signal) => {
      if (code === 0 || allowFailure) return resolve({ code, output })
      const tail = output.trim().split('\n').slice(-25).join('\n')
      reject(new Stop(`${command} ${args[0] ?? ''} ended with ${signal ?? code}.${tail ? `\n${tail}` : ''}`))
    })
  })
}

/** Runs the main function of a command: a `Stop` is a sentence, anything else is a bug with its stack. */
export function main(body) {
  body().catch((error) => {
    process.stderr.write(`${error instanceof Stop ? error.message : error.stack}\n`)
    process.exit(1)
  })
}
