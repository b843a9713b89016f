type Entry = { value: { headers: Record<string, string> }; lastModified: number; tags: string[] }

export default class KeptPages {
  get(key: string): Promise<Entry | null>
  set(key: string, value: object | null, context: { tags?: string[]; cacheControl?: object }): Promise<void>
  revalidateTag(tags: string | string[]): Promise<void>
  resetRequestCache(): void
}
export declare function evict(path: string): void
