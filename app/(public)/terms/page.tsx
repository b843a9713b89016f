import type { Metadata } from 'next'
import { terms } from '@/lib/messages/legal'
import { LegalPage } from '../_parts/legal-page'

export const dynamic = 'force-static'

export const metadata: Metadata = { title: terms.title, description: terms.lead }

export default function TermsPage() {
  return <LegalPage text={terms} />
}
