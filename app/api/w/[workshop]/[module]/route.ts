import { ModuleParams } from '@/lib/contracts/module-forms'
import { ModuleQuery } from '@/lib/contracts/modules'
import { refuseFields } from '@/lib/contracts/problem'
import { isCountry } from '@/lib/core/data/country'
import { ok, refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { signUpWords } from '@/lib/messages/signups'
import { getModulePublic } from '@/lib/queries/public/get-module-public'

export const GET = route(
  { deed: 'module:visit', params: ModuleParams, query: ModuleQuery },
  async ({ params, query: { country }, now }) => {
    if (country !== undefined && !isCountry(country))
      return refuseFields({ country: signUpWords.countryUnknown })
    const page = await getModulePublic({ ...params, country, now })
    return page ? ok(page) : refuse('not_found')
  },
)
