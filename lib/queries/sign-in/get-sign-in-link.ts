import 'server-only'
import { hashToken } from '@/lib/config/secrets'
import { SignInToken } from '@/models'

/** The address and the path to go on at of a mailed link; null when it is unknown or was used. */
export async function getSignInLink(
  token: string,
): Promise<{ email: string; returnTo: string | null } | null> {
  const row = await SignInToken.findOne({ where: { tokenHash: hashToken(token) } })
  return row && { email: row.emailNormal, returnTo: row.returnTo }
}
