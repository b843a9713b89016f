import { Button, ButtonRow, LinkButton } from '@/components/ui/button'
import { CopyText } from '@/components/ui/copy-text'
import { Dialog } from '@/components/ui/dialog'
import { DeedForm } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { Progress } from '@/components/ui/progress'
import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import { Tabs } from '@/components/ui/tabs'

export function Marks() {
  return (
    <Sheet id="marks" title="Buttons, marks, notices" aside={<StateMark kind="attention">Waiting</StateMark>}>
      <div className="flex flex-col gap-6">
        <Tabs
          label="Example"
          tabs={[
            { href: '#marks', label: 'Overview', current: true },
            { href: '#fields', label: 'Orders', count: 41 },
            { href: '#tables', label: 'Costs' },
            { href: '#lists', label: 'Messages', count: 3 },
          ]}
        />
        <ButtonRow>
          <Button type="button">Order with obligation to pay: 25.00 € now</Button>
          <LinkButton href="#fields">Look at the fields</LinkButton>
          <Button type="button" kind="destructive">
            Call off and pay 41 people back
          </Button>
          <Button type="button" kind="plain">
            Not now
          </Button>
          <Button type="button" disabled>
            Not possible yet
          </Button>
          <Dialog opener="Open a dialog" title="Before you go on">
            <p>Escape closes this; so does the button.</p>
          </Dialog>
          <DeedForm action="/sandbox/pieces">
            <Button kind="secondary" type="button">
              One deed
            </Button>
          </DeedForm>
        </ButtonRow>
        <p className="flex flex-wrap gap-x-6 gap-y-2">
          <StateMark kind="done">Ready</StateMark>
          <StateMark kind="open">Not started</StateMark>
          <StateMark kind="attention">Waiting for you</StateMark>
          <StateMark kind="stopped">Called off</StateMark>
        </p>
        <div className="grid gap-5 sm:grid-cols-2">
          <Notice title="What happens to your money">
            Deposits stay where they can be paid back from until the decision.
          </Notice>
          <Notice kind="done" title="Done">
            Your place is kept. A mail is on its way.
          </Notice>
          <Notice kind="attention" title="Needs you">
            The card was refused. Pay by another way before 4 May 2027.
          </Notice>
          <Notice kind="stopped" title="Called off">
            Everyone has been paid back.
          </Notice>
        </div>
        <div className="flex flex-col gap-4">
          <Progress label="Charging balances" done={0} total={41} />
          <Progress label="Charging balances" done={23} total={41} failed={2} />
          <Progress label="Charging balances" done={41} total={41} />
        </div>
        <CopyText text="RB123456785IE" label="tracking number" />
      </div>
    </Sheet>
  )
}
