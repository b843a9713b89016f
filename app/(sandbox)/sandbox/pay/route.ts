import { SandboxPay } from '@/lib/contracts/sandbox'
import { sandboxRoute } from '@/lib/http/sandbox-route'
import { payInSandbox } from '@/lib/services/sandbox/pay'

export const POST = sandboxRoute({ body: SandboxPay }, ({ body }) => payInSandbox(body))
