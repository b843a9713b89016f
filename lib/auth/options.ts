import 'server-only'
import type { AuthOptions } from 'next-auth'
import EmailProvider from 'next-auth/providers/email'
import { env } from '@/lib/config/env'
import { paths } from '@/lib/paths'
import { adapter } from './adapter'
import { HOST_COOKIE, SESSION_COOKIE } from './cookies'

/** A link works for ten minutes. */
export const LINK_SECONDS = 600
/** A browser stays signed in for 30 days of use. */
export const SESSION_SECONDS = 30 * 24 * 3600

/** next-auth with e-mail links and sessions in the database. Made when first asked for: a build has no settings. */
export function authOptions(): AuthOptions {
  return {
    adapter,
    secret: env().AUTH_SECRET,
    session: { strategy: 'database', maxAge: SESSION_SECONDS, updateAge: 24 * 3600 },
    useSecureCookies: true,
    cookies: {
      sessionToken: { name: SESSION_COOKIE, options: HOST_COOKIE },
      callbackUrl: { name: '__Host-brimline.callback', options: HOST_COOKIE },
      csrfToken: { name: '__Host-brimline.csrf', options: HOST_COOKIE },
    },
    pages: { signIn: paths.signIn(), error: paths.signIn(), verifyRequest: paths.signInSent },
    providers: [
      EmailProvider({
        maxAge: LINK_SECONDS,
        async sendVerificationRequest() {
          throw new Error('Links are sent by request-sign-in-link.')
        },
      }),
    ],
    callbacks: {
      redirect: ({ url, baseUrl }) =>
        url.startsWith('/') ? `${baseUrl}${url}` : new URL(url).origin === baseUrl ? url : baseUrl,
    },
  }
}
