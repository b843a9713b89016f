import { Facts } from '@/components/ui/facts'
import type { LinkedSignUp as Linked } from '@/lib/contracts/signups'
import { countryName } from '@/lib/core/data/country'
import { offerWords } from '@/lib/messages/public'
import { signUpWords as words } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'

/** What the sign-up behind a mailed link says. */
export function LinkedSignUp({ signUp }: { signUp: Linked }) {
  const { workshop, module, offer, quantity, country, certainty } = signUp
  return (
    <div className="max-w-md pb-5">
      <Facts
        facts={[
          {
            name: words.what,
            value: <a href={paths.module(workshop.slug, module.slug)}>{module.name}</a>,
          },
          { name: words.form, value: `${offerWords[offer]}, ${words.units(quantity)}` },
          { name: words.goesTo, value: countryName(country) },
          { name: words.certainty, value: words.certainties[certainty][0] },
        ]}
      />
    </div>
  )
}
