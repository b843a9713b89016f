// Loaded before a child of the supervisor. The supervisor holds the other end of our standard input: when it is
// gone, however it went, so are we.
process.stdin.on('end', () => process.kill(process.pid, 'SIGTERM'))
process.stdin.on('error', () => process.kill(process.pid, 'SIGTERM'))
process.stdin.resume()
process.stdin.unref?.()
