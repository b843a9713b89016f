import { Container, Head, Heading, Html, Preview, Section, Text } from '@react-email/components'
import { BlockView } from '@/emails/_blocks'
import { type Foot } from '@/emails/_foot'
import { type Letter } from '@/emails/_letter'
import { DARK_SHEET, ink, light, mono, sans } from '@/emails/_look'

const terms = (letter: Letter) => letter.blocks.filter((block) => block.kind === 'terms')
const main = (letter: Letter) => letter.blocks.filter((block) => block.kind !== 'terms')

/** One sheet with a title block at its foot; readable with styles, images and dark mode in any combination. */
export function LetterSheet({ letter, foot }: { letter: Letter; foot: Foot }) {
  return (
    <Html lang="en" dir="ltr">
      <Head>
        <title>{letter.subject}</title>
        <meta name="color-scheme" content="light dark" />
        <meta name="supported-color-schemes" content="light dark" />
        <style>{DARK_SHEET}</style>
      </Head>
      {/* Not the package's Body: it moves the colours to a cell the dark rules cannot reach. */}
      <body className="paper" style={{ margin: 0, backgroundColor: light.paper, fontFamily: sans }}>
        <Preview>{letter.preview}</Preview>
        <Section className="paper" style={{ backgroundColor: light.paper }}>
          <div style={{ padding: '24px 8px' }}>
            <Container
              className="sheet"
              style={{ maxWidth: 600, backgroundColor: light.sheet, border: `1px solid ${light.ink}` }}
            >
              <Section style={{ padding: '24px 24px 8px' }}>
                <Heading
                  as="h1"
                  className="ink"
                  style={{ ...ink, fontSize: 21, lineHeight: '28px', margin: '0 0 16px' }}
                >
                  {letter.subject}
                </Heading>
                {main(letter).map((block, i) => (
                  <BlockView key={i} block={block} />
                ))}
                <Text className="ink" style={{ ...ink, margin: '24px 0 16px', fontWeight: 700 }}>
                  {foot.signedBy}
                </Text>
                {terms(letter).map((block, i) => (
                  <BlockView key={i} block={block} />
                ))}
              </Section>
              <Section
                className="edge"
                style={{ padding: '12px 24px 16px', borderTop: `1px solid ${light.ink}` }}
              >
                {foot.lines.map((line) => (
                  <Text key={line} className="quiet" style={{ ...small, fontFamily: mono }}>
                    {line}
                  </Text>
                ))}
                {foot.unsubscribe ? (
                  <Text className="quiet" style={{ ...small, fontFamily: mono }}>
                    <a className="tide" href={foot.unsubscribe.url} style={{ color: light.tide }}>
                      {foot.unsubscribe.label}
                    </a>
                  </Text>
                ) : null}
              </Section>
            </Container>
          </div>
        </Section>
      </body>
    </Html>
  )
}

const small = { color: light.quiet, fontSize: 12, lineHeight: '18px', margin: 0 }
