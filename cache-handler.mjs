import { createHash } from 'node:crypto'
import { contentPolicy } from './lib/http/content-policy.mjs'

// Keeps the pages the framework makes once, in memory, each with a content security policy made from its own
// inline scripts: right on a miss, a hit and after it is made again, at the price of neither a nonce (which would
// make every page dynamic) nor a proxy in front (which would halve the requests).
const MOST_PAGES = 2000
const AGAIN_MS = 5000
const INLINE_SCRIPT = /<script(?![^>]*\ssrc=)[^>]*>([\s\S]*?)<\/script>/g

// The framework makes an instance per request; the pages belong to the process.
const pages = (globalThis.brimlinePages ??= new Map())
const tagTimes = (globalThis.brimlineTagTimes ??= new Map())

export default class KeptPages {
  async get(key) {
    const entry = pages.get(key)
    if (!entry) return null
    const isStale = entry.tags.some((tag) => (tagTimes.get(tag) ?? 0) >= entry.lastModified)
    return isStale ? null : entry
  }

  async set(key, value, { tags = [], cacheControl } = {}) {
    if (!value) return void pages.delete(key)
    if (value.kind === 'APP_PAGE' && typeof value.html === 'string') {
      value.headers = { ...value.headers, 'content-security-policy': policyOf(value.html) }
    }
    const ofPage = value.headers?.['x-next-cache-tags']?.split(',') ?? []
    pages.delete(key)
    pages.set(key, { value, cacheControl, lastModified: Date.now(), tags: [...tags, ...ofPage] })
    // Addresses nobody made are kept too; the oldest go first.
    if (pages.size > MOST_PAGES) pages.delete(pages.keys().next().value)
  }

  async revalidateTag(tags) {
    for (const tag of [tags].flat()) tagTimes.set(tag, Date.now())
  }

  resetRequestCache() {}
}

function policyOf(html) {
  const hashes = new Set()
  for (const [, script] of html.matchAll(INLINE_SCRIPT)) {
    if (script) hashes.add(`'sha256-${createHash('sha256').update(script).digest('base64')}'`)
  }
  const isHttps = process.env.BASE_URL?.startsWith('https:') ?? false
  return contentPolicy({ scripts: [...hashes], cardPageUrl: process.env.CARD_PAGE_URL, isHttps })
}

/**
 * Drops the copy of one page, or every copy. Once more a little later: a page whose making began before the change
 * may be kept after it.
 */
export function evict(path) {
  drop(path)
  setTimeout(drop, AGAIN_MS, path).unref()
}

function drop(path) {
  if (path === '*') return pages.clear()
  const ending = `/$${path === '/' ? '/index' : path}`
  for (const key of pages.keys()) if (key === path || key.endsWith(ending)) pages.delete(key)
}
