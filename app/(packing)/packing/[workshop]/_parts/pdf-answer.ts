/** A paper as the browser shows it; never kept anywhere on the way, since addresses stand on it. */
export function pdfAnswer(pdf: Buffer, name: string): Response {
  return new Response(new Uint8Array(pdf), {
    headers: {
      'content-type': 'application/pdf',
      'content-disposition': `inline; filename="${name.replace(/[^A-Za-z0-9._-]/g, '-')}"`,
      'cache-control': 'no-store',
    },
  })
}
