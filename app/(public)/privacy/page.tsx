import type { Metadata } from 'next'
import { privacy } from '@/lib/messages/legal'
import { LegalPage } from '../_parts/legal-page'

export const dynamic = 'force-static'

export const metadata: Metadata = { title: privacy.title, description: privacy.lead }

export default function PrivacyPage() {
  return <LegalPage text={privacy} />
}
