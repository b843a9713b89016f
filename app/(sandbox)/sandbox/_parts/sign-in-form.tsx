import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { TextField } from '@/components/ui/text-field'
import { sandboxWords } from '@/lib/messages/sandbox'

const words = sandboxWords.signIn

/** Signs in as anybody, without a mail. */
export function SignInForm({ form }: { form?: FormState }) {
  return (
    <Form action="/sandbox/sign-in" form={form} foot={<Button>{words.button}</Button>}>
      <TextField
        name="email"
        type="email"
        label={words.email}
        hint={words.lead}
        form={form}
        autoComplete="off"
      />
    </Form>
  )
}
