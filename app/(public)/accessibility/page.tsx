import type { Metadata } from 'next'
import { accessibility } from '@/lib/messages/legal'
import { LegalPage } from '../_parts/legal-page'

export const dynamic = 'force-static'

export const metadata: Metadata = { title: accessibility.title, description: accessibility.lead }

export default function AccessibilityPage() {
  return <LegalPage text={accessibility} />
}
