import NextAuth from 'next-auth'
import { NextRequest } from 'next/server'
import { authOptions } from '@/lib/auth/options'
import { env } from '@/lib/config/env'
import { SignInLinkInput } from '@/lib/contracts/sign-in'
import { readBody } from '@/lib/http/body'
import { problem } from '@/lib/http/errors'
import { isOwnOrigin } from '@/lib/http/origin'
import { paths } from '@/lib/paths'
import { getSignInLink } from '@/lib/queries/sign-in/get-sign-in-link'

type Segment = { params: Promise<{ nextauth: string[] }> }

const isLink = async ({ params }: Segment) => (await params).nextauth.join('/') === 'callback/email'

/** Opening a mailed link must not use it: mail scanners do. Its page has a button that posts. */
export async function GET(request: NextRequest, segment: Segment) {
  if (await isLink(segment)) return problem('method_not_allowed', { headers: { allow: 'POST' } })
  return NextAuth(request, segment, authOptions())
}

export async function POST(request: NextRequest, segment: Segment) {
  if (!(await isLink(segment))) return NextAuth(request, segment, authOptions())
  if (!isOwnOrigin(request, true)) return problem('wrong_origin')
  const read = await readBody(request)
  const input = SignInLinkInput.safeParse(read.ok ? read.value.body : {})
  const link = input.success ? await getSignInLink(input.data.token) : null
  if (!input.success || !link) return problem('token_unknown')
  const callback = new URL(paths.api.signInCallback, env().BASE_URL)
  callback.search = new URLSearchParams({
    email: link.email,
    token: input.data.token,
    callbackUrl: `${env().BASE_URL}${link.returnTo ?? paths.account}`,
  }).toString()
  const answer: Response = await NextAuth(
    new NextRequest(callback, { headers: request.headers }),
    segment,
    authOptions(),
  )
  return new Response(null, { status: 303, headers: answer.headers })
}
