export declare function evict(path: string): void
