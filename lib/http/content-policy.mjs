/** Where a form may end up besides ourselves: the provider's hosted pages. */
const HOSTED = ['https://checkout.stripe.com', 'https://connect.stripe.com']

/**
 * The content security policy of a page. `scripts` are the sources its inline scripts are known by: hashes for a
 * kept page, a nonce for one made per request.
 * @param {{ scripts: readonly string[], cardPageUrl?: string, isDev?: boolean, isHttps?: boolean }} page
 */
export function contentPolicy({ scripts, cardPageUrl, isDev = false, isHttps = false }) {
  const forms = ["'self'", ...HOSTED, ...(cardPageUrl ? [new URL(cardPageUrl).origin] : [])]
  return [
    "default-src 'self'",
    `script-src ${["'self'", ...scripts, ...(isDev ? ["'unsafe-eval'"] : [])].join(' ')}`,
    `style-src-elem 'self'${isDev ? " 'unsafe-inline'" : ''}`,
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "media-src 'self' blob:",
    `connect-src 'self'${isDev ? ' ws:' : ''}`,
    "object-src 'none'",
    "frame-src 'none'",
    "frame-ancestors 'none'",
    "base-uri 'none'",
    `form-action ${forms.join(' ')}`,
    ...(isHttps ? ['upgrade-insecure-requests'] : []),
  ].join('; ')
}

/** For answers that are no pages: nothing may load, nothing may frame them. */
export const BARE_POLICY = "default-src 'none'; frame-ancestors 'none'"
