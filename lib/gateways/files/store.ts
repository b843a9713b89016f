import 'server-only'
import { createHash } from 'node:crypto'
import { mkdir, readFile, rename, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { env } from '@/lib/config/env'

/** Where bytes of this content lie: by their hash, so that the same file is kept once. */
function placeOf(sha256: string): string {
  if (!/^[0-9a-f]{64}$/.test(sha256)) throw new RangeError(`sha256 must be 64 hex digits, got ${sha256}`)
  return join(env().BRIMLINE_DATA, 'files', sha256.slice(0, 2), sha256)
}

/** Keeps bytes under their hash and gives it back; whole or not at all, however often. */
export async function keepFile(content: Buffer): Promise<string> {
  const sha256 = createHash('sha256').update(content).digest('hex')
  const place = placeOf(sha256)
  await mkdir(join(place, '..'), { recursive: true })
  const beside = `${place}.${process.pid}.${Date.now()}`
  await writeFile(beside, content)
  await rename(beside, place)
  return sha256
}

/** The bytes of a hash; null when they are not here. */
export async function readKeptFile(sha256: string): Promise<Buffer | null> {
  return readFile(placeOf(sha256)).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return null
    throw error
  })
}
