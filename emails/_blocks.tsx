import { Button, Link, Section, Text } from '@react-email/components'
import { Fragment } from 'react'
import { paragraphsOf, type Block, type Row } from '@/emails/_letter'
import { ink, light, mono } from '@/emails/_look'

const gap = { margin: '0 0 16px' }

function Lines({ lines }: { lines: string[] }) {
  return lines.map((line, i) => (
    <Fragment key={i}>
      {i > 0 ? <br /> : null}
      {line}
    </Fragment>
  ))
}

function RowsView({ rows }: { rows: Row[] }) {
  const cell = { padding: '8px 0', borderTop: `1px solid ${light.rule}`, verticalAlign: 'top' } as const
  return (
    <table width="100%" cellPadding={0} cellSpacing={0} style={{ borderCollapse: 'collapse', ...gap }}>
      <tbody>
        {rows.map((row, i) => (
          <tr key={i}>
            <th
              className="rule"
              scope="row"
              style={{ ...cell, textAlign: 'left', fontWeight: row.strong ? 700 : 400 }}
            >
              <span className="ink" style={{ ...ink, fontSize: 15, lineHeight: '22px' }}>
                {row.label}
              </span>
              {row.note ? (
                <span
                  className="quiet"
                  style={{ display: 'block', color: light.quiet, fontSize: 13, lineHeight: '20px' }}
                >
                  {row.note}
                </span>
              ) : null}
            </th>
            <td
              className="rule"
              align="right"
              style={{ ...cell, paddingLeft: 16, fontWeight: row.strong ? 700 : 400 }}
            >
              <span className="ink" style={{ ...ink, fontSize: 14, lineHeight: '22px', fontFamily: mono }}>
                {row.value}
              </span>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}

/** One block of a letter. */
export function BlockView({ block }: { block: Block }) {
  switch (block.kind) {
    case 'para':
      return (
        <Text className="ink" style={{ ...ink, ...gap }}>
          {block.text}
        </Text>
      )
    case 'rows':
      return <RowsView rows={block.rows} />
    case 'action':
      return (
        <Section style={{ margin: '8px 0 20px' }}>
          <Button
            className="button"
            href={block.url}
            style={{
              backgroundColor: light.tide,
              color: light.sheet,
              padding: '12px 20px',
              borderRadius: 2,
              fontSize: 16,
              fontWeight: 700,
            }}
          >
            {block.label}
          </Button>
        </Section>
      )
    case 'link':
      return (
        <Text className="ink" style={{ ...ink, ...gap }}>
          <Link className="tide" href={block.url} style={{ color: light.tide, textDecoration: 'underline' }}>
            {block.label}
          </Link>
        </Text>
      )
    case 'written':
      return (
        <Section className="edge" style={{ ...gap, borderLeft: `2px solid ${light.ink}`, paddingLeft: 16 }}>
          {paragraphsOf(block.text).map((lines, i) => (
            <Text key={i} className="ink" style={{ ...ink, margin: '0 0 12px' }}>
              <Lines lines={lines} />
            </Text>
          ))}
        </Section>
      )
    case 'terms':
      return (
        <Section className="rule" style={{ borderTop: `1px solid ${light.rule}`, padding: '12px 0 8px' }}>
          <h2 className="ink" style={{ ...ink, fontSize: 15, margin: '0 0 8px' }}>
            {block.title}
          </h2>
          {paragraphsOf(block.text).map((lines, i) => (
            <Text
              key={i}
              className="quiet"
              style={{ color: light.quiet, fontSize: 13, lineHeight: '20px', margin: '0 0 8px' }}
            >
              <Lines lines={lines} />
            </Text>
          ))}
        </Section>
      )
  }
}
