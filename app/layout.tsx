import type { Metadata, Viewport } from 'next'
import { faces } from '@/fonts/faces'
import { ui } from '@/lib/messages/ui'
import './globals.css'

export const metadata: Metadata = {
  title: { default: ui.siteName, template: `%s · ${ui.siteName}` },
}

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#f4f1ea' },
    { media: '(prefers-color-scheme: dark)', color: '#12181b' },
  ],
}

export default function RootLayout({ children }: { children: React.ReactNode }) {
  return (
    <html lang="en" className={faces}>
      <body className="bg-paper text-17 text-ink">{children}</body>
    </html>
  )
}
