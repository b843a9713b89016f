import { toSVG } from 'bwip-js/node'
import { CopyText } from '@/components/ui/copy-text'
import { Sheet } from '@/components/ui/sheet'
import { secondFactorWords as words } from '@/lib/messages/second-factor'

type Props = { secret: string; uri: string; recoveryCodes: readonly string[] }

/** What is needed once: the square and the key for the authenticator, and the codes for the day the phone is gone. */
export function SetUpSheet({ secret, uri, recoveryCodes }: Props) {
  const square = Buffer.from(toSVG({ bcid: 'qrcode', text: uri, scale: 3 })).toString('base64')
  return (
    <Sheet title={words.key}>
      <p className="max-w-words">{words.scan}</p>
      <img
        src={`data:image/svg+xml;base64,${square}`}
        alt={words.squareAlt}
        width={200}
        height={200}
        className="bg-white my-4 p-3"
      />
      <p className="figures break-all">{secret}</p>
      <CopyText text={secret} label={words.key} />
      <h3 className="pt-5 text-17">{words.recovery}</h3>
      <p className="max-w-words text-15">{words.recoveryLead}</p>
      <ul className="figures grid grid-cols-2 gap-x-6 pt-2 sm:grid-cols-4">
        {recoveryCodes.map((code) => (
          <li key={code}>{code}</li>
        ))}
      </ul>
    </Sheet>
  )
}
