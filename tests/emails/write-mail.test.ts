import { describe, expect, test } from 'vitest'
import { dark, light } from '@/emails/_look'
import { writeMail } from '@/emails/write-mail'
import { MAIL_KINDS, MAILS, SECRET_LINKS, UNSUBSCRIBABLE, type MailKind } from '@/lib/contracts/mails'
import { sampleFacts, sampleSender } from './sample-facts'

const unsubscribeUrl = 'https://brimline.example/unsubscribe/q8Hn2mYw4tZr6vKs0pLd1xCf3gJb5aUe7iOoT9zN_Xk'
const isNews = (kind: MailKind) => (UNSUBSCRIBABLE as readonly MailKind[]).includes(kind)
const write = <K extends MailKind>(kind: K, change: object = {}) =>
  writeMail(kind, { ...sampleFacts[kind], ...change }, sampleSender, isNews(kind) ? unsubscribeUrl : null)

const ENTITIES: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"', '#x27': "'", '#39': "'" }
const decoded = (html: string) =>
  html.replaceAll(/&(#?\w+);/g, (whole, name: string) => ENTITIES[name] ?? whole)
const squeezed = (text: string) => text.replaceAll(/[\s\u00A0]+/g, ' ').trim()

/** The texts a reader of the HTML sees, one per element, without the inbox's preview line. */
function visibleTexts(html: string): string[] {
  const body = html.slice(html.indexOf('<h1'))
  return body
    .replaceAll(/<!--.*?-->/gs, '')
    .split(/<[^>]+>/)
    .map((text) => squeezed(decoded(text)))
    .filter((text) => text !== '')
}
const linksOfHtml = (html: string) =>
  [...html.matchAll(/href="([^"]+)"/g)].map((found) => decoded(found[1] ?? ''))
const linksOfText = (text: string) => text.split('\n').filter((line) => /^https?:\/\/\S+$/.test(line))

describe.each(MAIL_KINDS)('%s', (kind) => {
  test('states the same in HTML and in plain text', async () => {
    const mail = await write(kind)
    const text = squeezed(mail.text.replaceAll(/^>/gm, ''))
    const [title, ...rest] = visibleTexts(mail.html)
    expect(title).toBe(squeezed(mail.subject))
    expect(rest.filter((seen) => !text.includes(seen))).toEqual([])
    expect(new Set(linksOfHtml(mail.html))).toEqual(new Set(linksOfText(mail.text)))
  })

  test('shows every link it was given', async () => {
    const given = Object.entries(sampleFacts[kind])
      .filter(([name]) => name.endsWith('Url'))
      .map(([, url]) => url as string)
    const mail = await write(kind)
    expect(linksOfText(mail.text)).toEqual(expect.arrayContaining(given))
  })

  test('loads nothing from anywhere and carries no script', async () => {
    const { html } = await write(kind)
    expect(html).not.toMatch(
      /<(img|script|link|iframe|video|audio|object|form)\b|\bsrc=|url\(|@import|@font-face/i,
    )
  })

  test('is signed by the maker and says how to answer', async () => {
    const { text } = await write(kind)
    expect(text).toContain('\n\nInes Tidewell, Hollow Pier Modular\n\n')
    expect(text).toContain('Answer this mail to reach Ines Tidewell.')
  })

  test('has a subject of one line and no exclamation mark', async () => {
    const mail = await write(kind)
    expect(mail.subject).toMatch(/^[^\p{Cc}]{5,120}$/u)
    expect(mail.text).not.toContain('!')
  })
})

test('news and invitations end with the link that stops them', async () => {
  const mail = await write('run_update')
  expect(mail.text.trimEnd().split('\n').slice(-2)).toEqual([
    'Stop news and invitations of this workshop:',
    unsubscribeUrl,
  ])
  expect((await write('refund_sent')).text).not.toContain('Stop news')
})

test('links that act for whoever holds them are named for every kind that has one', () => {
  const token = 'q8Hn2mYw4tZr6vKs0pLd1xCf3gJb5aUe7iOoT9zN_Xk'
  for (const kind of MAIL_KINDS) {
    const withToken = Object.entries(sampleFacts[kind]).filter(([, fact]) =>
      JSON.stringify(fact).includes(token),
    )
    expect([kind, withToken.map(([name]) => name).sort()]).toEqual([
      kind,
      [...(SECRET_LINKS[kind] ?? [])].sort(),
    ])
  }
})

test('the deposit receipt states lines, tax, both payments and the whole terms', async () => {
  const { subject, text } = await write('deposit_received')
  expect(subject).toBe('Deposit received: order HP-1042, Rowlock')
  // 2 × 95.00 + 11.90 postage = 201.90; 2 × 25.00 deposit leaves 151.90; 19 % in 201.90 is 32.24 (by hand).
  for (const line of [
    '2 × Rowlock, kit: €190.00',
    'Postage: €11.90',
    'Total: €201.90',
    'Tax included: €32.24',
    'Deposit, paid: €50.00',
    'Balance, to pay later: €151.90',
  ]) {
    expect(text.split('\n')).toContain(line)
  }
  expect(text).toContain('2. What you buy\nA kit is a set of parts & boards that you solder <yourself>.')
})

test('tax that is added stands before the total, tax that is included after it', async () => {
  const order = (text: string) =>
    text
      .split('\n')
      .filter((line) => /^(Tax|Total)/.test(line))
      .map((line) => line.split(':')[0])
  expect(order((await write('deposit_received')).text)).toEqual(['Total', 'Tax included'])
  expect(order((await write('deposit_received', { taxIncluded: false })).text)).toEqual(['Tax', 'Total'])
  expect(order((await write('deposit_received', { taxMinor: 0 })).text)).toEqual(['Total'])
})

test('a mail of no workshop is signed by Brimline alone and takes no answers', async () => {
  const platform = {
    workshop: 'Brimline',
    maker: 'Brimline',
    replyTo: null,
    postalAddress: [],
    timeZone: 'UTC',
  }
  const { text } = await writeMail('sign_in_link', sampleFacts.sign_in_link, platform, null)
  expect(text.slice(text.indexOf('\n\nBrimline'))).toBe(
    '\n\nBrimline\n\n-- \nNobody reads answers to this address.\nSent by Brimline.\n',
  )
})

test('money follows the currency, instants the zone of the workshop', async () => {
  const yen = await write('refund_sent', { currency: 'JPY', amountMinor: 32000 })
  expect(yen.text).toContain('JP¥32,000')
  // 16:30 UTC on 2 April is 18:30 in Berlin: summer time began on 28 March 2027.
  expect((await write('place_free')).text).toMatch(/2 April 2027, 18:30 (CEST|GMT\+2)/)
})

test('an invitation names the head start while there is one', async () => {
  expect((await write('deposits_open')).text).toContain('everybody else can from 3 March 2027, 10:00 CET')
  const late = await write('deposits_open', { opensToAllAt: null })
  expect(late.text).toContain('The run is open, and you can order now.')
  expect(late.text).not.toContain('everybody else')
})

test('what silence means is said with its day', async () => {
  const cancels = await write('delay_notice')
  expect(cancels.text).toContain('If you do not answer by 28 September 2027, the order is cancelled')
  const waits = await write('delay_notice', { silenceMeans: 'wait', answerBy: null, refundBy: null })
  expect(waits.text).toContain('If you do not answer, you keep your place.')
  expect(waits.text).not.toContain('the money is sent back by')
})

test('what a maker wrote stays text', async () => {
  const text = '<script>alert(1)</script> & <b>bold</b>\n\nSecond paragraph'
  const mail = await write('run_update', { text })
  expect(mail.html).toContain('&lt;script&gt;alert(1)&lt;/script&gt; &amp; &lt;b&gt;bold&lt;/b&gt;')
  expect(mail.html).not.toContain('<script')
})

test.each(['Rowlock\r\nBcc: all@example.org', 'Rowlock\nX: y', 'Row\u2028lock', 'Row\u0000lock', ''])(
  'a name that is not one line is refused: %j',
  async (module) => {
    await expect(write('place_released', { module })).rejects.toThrow()
    expect(MAILS.place_released.safeParse({ ...sampleFacts.place_released, module }).success).toBe(false)
  },
)

test.each(['javascript:alert(1)', '/account/orders/1', 'ftp://files.example/a'])(
  'a link that is %s is refused',
  (url) => {
    expect(MAILS.sign_in_link.safeParse({ signInUrl: url, validMinutes: 10 }).success).toBe(false)
  },
)

// WCAG 2.2, definitions of relative luminance and contrast ratio.
const luminance = (hex: string) => {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const c = parseInt(hex.slice(at, at + 2), 16) / 255
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4
  }) as [number, number, number]
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}
const contrast = (a: string, b: string) => {
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number]
  return (high + 0.05) / (low + 0.05)
}
test.each([
  ['light', light],
  ['dark', dark],
])('text reads at 4.5:1 or better in %s', (_name, look) => {
  for (const colour of [look.ink, look.quiet, look.tide])
    expect(contrast(colour, look.sheet)).toBeGreaterThanOrEqual(4.5)
  expect(contrast(look === light ? light.sheet : dark.paper, look.tide)).toBeGreaterThanOrEqual(4.5)
})
