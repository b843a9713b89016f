import { DayText } from '@/components/format/day-text'
import { Money } from '@/components/format/money'
import { When } from '@/components/format/when'
import { CheckAnswers } from '@/components/ui/check-answers'
import { Disclosure } from '@/components/ui/disclosure'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import { StepsList } from '@/components/ui/steps-list'
import { StoryList } from '@/components/ui/story-list'

const zone = 'Europe/Dublin'

export function Lists() {
  return (
    <Sheet id="lists" title="Lists">
      <div className="grid gap-8 md:grid-cols-2">
        <StepsList
          steps={[
            { key: 'a', title: 'Deposit', state: 'done', detail: <DayText day="2027-03-03" /> },
            { key: 'b', title: 'Decision', state: 'now', detail: 'By 18 May 2027' },
            { key: 'c', title: 'Balance', state: 'to_come' },
            { key: 'd', title: 'Posting', state: 'to_come' },
          ]}
        />
        <StoryList
          happenings={[
            {
              key: 'a',
              when: <When at="2027-03-03T13:05:00Z" zone={zone} />,
              words: 'You paid the deposit.',
              mark: 'done',
            },
            {
              key: 'b',
              when: <When at="2027-05-18T16:00:00Z" zone={zone} />,
              words: 'The run was locked.',
              detail: 'Modules are being made. The balance falls due when units pass their test.',
              mark: 'done',
            },
            {
              key: 'c',
              when: <When at="2027-07-01T08:00:00Z" zone={zone} />,
              words: 'Your card was refused.',
              mark: 'attention',
            },
            {
              key: 'd',
              when: <DayText day="2027-07-15" weekday />,
              words: 'The place lapses unless paid.',
              mark: 'open',
            },
          ]}
        />
        <CheckAnswers
          answers={[
            { key: 'a', question: 'Form', answer: 'Kit, two of them', changeHref: '#a' },
            {
              key: 'b',
              question: 'Goes to',
              answer: 'Ada Example, 1 Long Street with many words, Dublin, Ireland',
              changeHref: '#b',
            },
            { key: 'c', question: 'To pay now', answer: <Money minor={5000} currency="EUR" /> },
          ]}
        />
        <Facts
          facts={[
            { name: 'Deposit', value: <Money minor={5000} currency="EUR" />, kind: 'figures' },
            { name: 'Balance', value: <Money minor={16400} currency="EUR" />, kind: 'figures' },
            { name: 'Posted by', value: <DayText day="2027-09-30" /> },
            { name: 'Goes to', value: 'Ada Example, 1 Long Street with many words, Dublin, Ireland' },
          ]}
        />
        <Disclosure summary="What the deposit is for">It keeps your place until the decision.</Disclosure>
      </div>
    </Sheet>
  )
}
