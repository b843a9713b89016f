import { createServer } from 'node:net'

/** A port nobody listens on at the loopback address; `preferred` when that one is free. */
export async function freePort(preferred) {
  if (preferred && (await tryPort(preferred))) return preferred
  return tryPort(0)
}

function tryPort(port) {
  return new Promise((resolve) => {
    const server = createServer()
    server.once('error', () => resolve(0))
    server.listen({ port, host: '127.0.0.1', exclusive: true }, () => {
      const found = server.address().port
      server.close(() => resolve(found))
    })
  })
}
