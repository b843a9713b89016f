import { breakEven } from '@/lib/core/costs/break-even'
import { FillGauge } from '@/components/charts/fill-gauge'
import { FrontPanelDrawing } from '@/components/charts/front-panel-drawing'
import { RunLine } from '@/components/charts/run-line'
import { StepChart } from '@/components/charts/step-chart'
import { Columns } from '@/components/ui/columns'
import { Sheet } from '@/components/ui/sheet'
import { controls, curve, steps } from './examples'

const open = { minimum: 60, maximum: 100, daysLeft: 17, decideBy: '2027-05-18' }

export function Drawings() {
  return (
    <>
      <Sheet
        id="gauge"
        title="Fill gauge"
        titleBlock={{
          what: 'Rowlock, run 1',
          revision: 'B',
          when: '1 May 2027',
          sheet: { number: 1, of: 4 },
        }}
      >
        <div className="flex flex-col gap-8">
          <Columns>
            <FillGauge size="large" deposited={41} {...open} forecast={{ mean: 66, low: 57, high: 76 }} />
            <div className="flex flex-col gap-6">
              <FillGauge deposited={41} {...open} />
              <FillGauge deposited={0} {...open} />
            </div>
          </Columns>
          <div className="grid gap-8 sm:grid-cols-2">
            <FillGauge deposited={64} {...open} forecast={{ mean: 88, low: 80, high: 160 }} />
            <FillGauge deposited={100} {...open} daysLeft={1} />
            <FillGauge deposited={12} minimum={38} maximum={40} daysLeft={0} />
            <FillGauge
              deposited={1}
              minimum={3}
              maximum={5}
              daysLeft={1}
              forecast={{ mean: 2.4, low: 1, high: 4 }}
            />
          </div>
          <p className="flex flex-col gap-3">
            <FillGauge size="small" deposited={41} {...open} />
            <FillGauge size="small" deposited={64} {...open} forecast={{ mean: 88, low: 80, high: 97 }} />
            <FillGauge size="small" deposited={100} {...open} daysLeft={0} />
          </p>
        </div>
      </Sheet>
      <Sheet id="front-panel" title="Front-panel drawing">
        <div className="flex flex-wrap items-start gap-8">
          <FrontPanelDrawing name="Rowlock" widthHp={12} controls={controls} />
          <FrontPanelDrawing
            name="A narrow one"
            widthHp={4}
            controls={controls.slice(1, 2).map((one) => ({ ...one, xMm: 10 }))}
          />
          <FrontPanelDrawing name="A blank" widthHp={8} controls={[]} size="plain" />
          <FrontPanelDrawing name="Rowlock" widthHp={12} controls={controls} size="plain" />
        </div>
      </Sheet>
      <Sheet id="run-line" title="Run line">
        <div className="flex flex-col gap-8">
          <RunLine steps={steps} today="2027-05-04" postedBy="2027-09-30" chance={0.83} />
          <RunLine steps={steps.slice(0, 2)} today="2027-11-04" postedBy="2027-06-30" />
          <RunLine steps={[]} today="2027-05-04" />
        </div>
      </Sheet>
      <Sheet id="step-chart" title="Step chart">
        <div className="flex flex-col gap-8">
          <StepChart
            profits={curve(100).map(({ profit }) => profit)}
            currency="EUR"
            minimum={60}
            maximum={100}
            deposited={41}
            forecast={{ mean: 66, low: 57, high: 76 }}
            breakEven={breakEven(curve(100))}
          />
          <StepChart
            profits={curve(30).map(({ profit }) => profit)}
            currency="GBP"
            minimum={25}
            maximum={30}
            deposited={12}
            breakEven={breakEven(curve(30))}
          />
          <StepChart
            profits={[]}
            currency="EUR"
            minimum={25}
            maximum={30}
            deposited={12}
            breakEven={breakEven([])}
          />
        </div>
      </Sheet>
    </>
  )
}
