import 'server-only'
import { createHash } from 'node:crypto'

const STYLE = `
:root{color-scheme:light dark;--paper:#F4F1EA;--sheet:#FBF9F4;--rule:#CFC8BA;--ink:#17232B;--quiet:#55626B;--tide:#0B5563;--rust:#A63D1E;--straw:#8A6510}
@media (prefers-color-scheme:dark){:root{--paper:#12181B;--sheet:#182024;--rule:#34424A;--ink:#E9E4D8;--quiet:#A3AFB5;--tide:#6FC3CF;--rust:#F0906E;--straw:#E0B954}}
*{box-sizing:border-box}
body{margin:0;background:var(--paper);color:var(--ink);font:17px/1.5 system-ui,sans-serif}
.mark{background:var(--ink);color:var(--paper);padding:12px 16px;font-weight:600}
main{max-width:560px;margin:0 auto;padding:24px 16px 48px}
h1{font-size:28px;line-height:1.2;margin:8px 0 16px}
.sum{font-family:ui-monospace,monospace;font-size:28px;margin:0 0 24px}
.sheet{background:var(--sheet);border:1px solid var(--rule);padding:16px;margin:0 0 24px}
label{display:block;color:var(--quiet);font-size:15px}
input{width:100%;font:17px ui-monospace,monospace;padding:12px;border:1px solid var(--quiet);border-radius:2px;background:var(--paper);color:var(--ink)}
button,a.button{display:inline-block;font:inherit;font-weight:600;padding:12px 16px;min-height:44px;border-radius:2px;border:1px solid var(--tide);background:var(--tide);color:var(--paper);cursor:pointer;margin:16px 12px 0 0;text-decoration:none}
button.other{background:transparent;color:var(--tide)}
a{color:var(--tide)}
:focus-visible{outline:2px solid var(--tide);outline-offset:2px}
.trouble{border-left:4px solid var(--rust);padding:8px 12px;margin:0 0 16px;background:var(--sheet)}
.table{overflow-x:auto}
table{border-collapse:collapse;width:100%;font-size:15px}
caption{text-align:left;font-weight:600;padding:8px 0}
td,th{text-align:left;border-top:1px solid var(--rule);padding:6px 8px 6px 0;vertical-align:top}
td:first-child{font-family:ui-monospace,monospace;white-space:nowrap}
`

const STYLE_HASH = createHash('sha256').update(STYLE).digest('base64')

/** Text made safe inside HTML. */
export function escape(text: string): string {
  const names: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  }
  return text.replace(/[&<>"']/g, (sign) => names[sign] ?? sign)
}

/** One answer of the card page’s server. */
export type Page = { status: number; html: string; headers: Record<string, string> }

/**
 * One page of the sandbox's provider: marked on top, no script. `leadsTo` are addresses a form may end at
 * (browsers apply form-action to the redirect as well).
 */
export function page(given: {
  status?: number
  title: string
  body: string
  leadsTo?: readonly (string | null)[]
}): Page {
  const origins = (given.leadsTo ?? []).flatMap((url) =>
    url !== null && URL.canParse(url) ? [new URL(url).origin] : [],
  )
  const policy = `default-src 'none'; img-src data:; style-src 'sha256-${STYLE_HASH}'; form-action 'self' ${[...new Set(origins)].join(' ')}; base-uri 'none'; frame-ancestors 'none'`
  const title = escape(given.title)
  return {
    status: given.status ?? 200,
    headers: {
      'content-type': 'text/html; charset=utf-8',
      'content-security-policy': policy.replaceAll(' ;', ';'),
      'cache-control': 'no-store',
      'referrer-policy': 'no-referrer',
      'x-content-type-options': 'nosniff',
    },
    html: `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width,initial-scale=1">
<title>${title} (sandbox)</title><link rel="icon" href="data:,"><style>${STYLE}</style></head>
<body><div class="mark" role="note">Sandbox card page, no real money</div><main><h1>${title}</h1>
${given.body}</main></body></html>`,
  }
}

/** A redirect after a form. */
export function seeOther(to: string): Page {
  return { status: 303, html: '', headers: { location: to, 'cache-control': 'no-store' } }
}
