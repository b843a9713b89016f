/** As much of the load generator as the bench uses; the package brings no types. */
declare module 'autocannon' {
  export type Request = {
    method?: string
    path?: string
    headers?: Record<string, string>
    body?: string
    setupRequest?: (request: Request) => Request
  }
  export type Options = { url: string; connections: number; duration: number; requests?: Request[] }
  export type Answer = { non2xx: number; errors: number; requests: { average: number } }
  export default function autocannon(options: Options): Promise<Answer>
}
