export const dynamic = 'force-static'

/** Nothing but a page: what the framework itself costs. */
export default function Page() {
  return <h1>Bare</h1>
}
