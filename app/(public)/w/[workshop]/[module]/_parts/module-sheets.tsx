import { FrontPanelDrawing } from '@/components/charts/front-panel-drawing'
import { CostSheet } from '@/components/module/cost-sheet'
import { MakerSheet } from '@/components/module/maker-sheet'
import { ModuleSummary } from '@/components/module/module-summary'
import { MoneySheet } from '@/components/module/money-sheet'
import { CautionsSheet, SpecificationSheet, TermsSheet } from '@/components/module/reading-sheets'
import { SignUpForm } from '@/components/module/sign-up-form'
import { Stack } from '@/components/ui/columns'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import type { ModulePage } from '@/lib/contracts/module-page'
import { publicWords as words } from '@/lib/messages/public'
import { signUpWords } from '@/lib/messages/signups'

/** Top to bottom: is it happening, what it is, what it costs, what happens to your money, the form, the rest. */
export function ModuleSheets({ page }: { page: ModulePage }) {
  const { workshop, module, offers, run } = page
  return (
    <Stack>
      <div className="grid items-start gap-6 md:grid-cols-2">
        <ModuleSummary page={page} />
        <FrontPanelDrawing name={module.name} widthHp={module.widthHp} controls={module.controls} />
      </div>
      {module.story || module.videoUrl ? (
        <Sheet title={words.storyTitle} id="story">
          <PlainText text={module.story} />
          {module.videoUrl ? (
            <p className="pt-3">
              <a href={module.videoUrl} rel="noopener noreferrer nofollow">
                {words.video}
              </a>
            </p>
          ) : null}
        </Sheet>
      ) : null}
      <CostSheet page={page} />
      <MoneySheet run={run} />
      {workshop.isOpen && offers.length > 0 ? (
        <Sheet title={signUpWords.title} id="interest">
          <p className="max-w-words pb-4">{signUpWords.lead}</p>
          <SignUpForm
            workshop={workshop.slug}
            module={module.slug}
            currency={workshop.currency}
            offers={offers}
          />
          <p className="max-w-words pt-4 text-15 text-quiet">{signUpWords.again}</p>
        </Sheet>
      ) : null}
      <CautionsSheet page={page} />
      <TermsSheet terms={page.terms} />
      <SpecificationSheet page={page} />
      <MakerSheet maker={page.maker} record={page.record} />
    </Stack>
  )
}
