import { Pool } from 'pg'

const pool = new Pool({ connectionString: process.env.DATABASE_URL, max: 10 })

/** One row through the driver alone: what any handler that writes something costs at least. */
export async function POST(request) {
  const { email } = await request.json()
  await pool.query('insert into bench_rows (email) values ($1)', [email])
  return Response.json({ next: 'confirm' }, { status: 202 })
}
