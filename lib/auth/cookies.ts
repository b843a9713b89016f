/** Names of our cookies. `__Host-` binds each to this very origin, and browsers accept it on loopback http too. */
export const SESSION_COOKIE = '__Host-brimline.session'
/** Marks the browser that asked for a sign-in link. */
export const ASKED_COOKIE = '__Host-brimline.asked'

export const HOST_COOKIE = { httpOnly: true, secure: true, sameSite: 'lax', path: '/' } as const

/** One cookie of a request's header; undefined when it is not there. */
export function cookieOf(request: Request, name: string): string | undefined {
  const pairs = (request.headers.get('cookie') ?? '').split(/;\s*/)
  const found = pairs.find((pair) => pair.startsWith(`${name}=`))
  return found === undefined ? undefined : decodeURIComponent(found.slice(name.length + 1))
}

/** A `Set-Cookie` value; `maxAge` in seconds, 0 removes it. */
export function setCookie(name: string, value: string, maxAge: number): string {
  return `${name}=${encodeURIComponent(value)}; Path=/; HttpOnly; Secure; SameSite=Lax; Max-Age=${maxAge}`
}
