import { spawn } from 'node:child_process'
import { mkdirSync } from 'node:fs'
import { dirname } from 'node:path'

/**
 * Runs `body` while no other process on this machine holds the lock on `file`. The kernel's own lock, held by
 * a child that ends with us however we end, so that a killed start leaves nothing behind.
 */
export async function withLock(file, body) {
  const release = await takeLock(file)
  try {
    return await body()
  } finally {
    release()
  }
}

/** Takes the lock and gives back its release; null when `wait` is false and another process holds it. */
export function takeLock(file, { wait = true } = {}) {
  mkdirSync(dirname(file), { recursive: true })
  const args = [...(wait ? [] : ['--nonblock']), file, 'sh', '-c', 'echo held; exec cat >/dev/null']
  const holder = spawn('flock', args, { stdio: ['pipe', 'pipe', 'ignore'], detached: true })
  return new Promise((resolve, reject) => {
    holder.on('error', (error) => (error.code === 'ENOENT' ? resolve(() => {}) : reject(error)))
    holder.on('close', () => resolve(null))
    holder.stdout.once('data', () => {
      // Held, it must not keep us alive; waited for, it must.
      holder.unref()
      holder.stdin.unref?.()
      holder.stdout.unref?.()
      resolve(() => holder.stdin.end())
    })
  })
}
