import 'server-only'
import { type Transaction } from 'sequelize'
import { type MailKind } from '@/lib/contracts/mails'
import { type OrderState } from '@/lib/core/states/order'
import {
  Invitation,
  NoticeAnswer,
  Order,
  PaymentAttempt,
  Run,
  SignInToken,
  SignUp,
  StaffInvitation,
} from '@/models'

type Question = (mail: { subjectId: string; now: Date }, transaction: Transaction) => Promise<boolean>

const orderIs =
  (...states: OrderState[]): Question =>
  async ({ subjectId }, transaction) => {
    const order = await Order.findByPk(subjectId, { attributes: ['state'], transaction })
    return order !== null && states.includes(order.state)
  }

/** One statement each; asked under the mail's lock, just before it is sent. */
const QUESTIONS: { readonly [K in MailKind]?: Question } = {
  confirm_signup: async ({ subjectId, now }, transaction) => {
    const signUp = await SignUp.findByPk(subjectId, {
      attributes: ['state', 'confirmExpiresAt'],
      transaction,
    })
    return signUp?.state === 'unconfirmed' && signUp.confirmExpiresAt > now
  },
  signup_confirmed: async ({ subjectId }, transaction) => {
    const signUp = await SignUp.findByPk(subjectId, { attributes: ['state'], transaction })
    return signUp?.state === 'confirmed'
  },
  deposits_open: async ({ subjectId }, transaction) => {
    const invitation = await Invitation.findByPk(subjectId, {
      attributes: ['state'],
      include: [
        { model: Run, as: 'run', attributes: ['state'] },
        { model: SignUp, as: 'signup', attributes: ['state'] },
      ],
      transaction,
    })
    const isOpen = invitation?.run?.state === 'taking_deposits' && invitation.signup?.state === 'confirmed'
    return invitation?.state === 'sent' && isOpen
  },
  run_changed: orderIs('waiting', 'awaiting_deposit', 'reserved'),
  place_free: orderIs('awaiting_deposit'),
  place_released: orderIs('expired'),
  balance_coming: orderIs('balance_due'),
  balance_reminder: orderIs('balance_due'),
  card_needs_you: async ({ subjectId }, transaction) => {
    const attempt = await PaymentAttempt.findByPk(subjectId, { attributes: ['orderId'], transaction })
    const orderId = attempt?.orderId ?? subjectId
    return orderIs('balance_due')({ subjectId: orderId, now: new Date(0) }, transaction)
  },
  delay_notice: noticeIsOpen,
  change_notice: noticeIsOpen,
  sign_in_link: async ({ subjectId, now }, transaction) => {
    const token = await SignInToken.findByPk(subjectId, { attributes: ['expiresAt'], transaction })
    return token !== null && token.expiresAt > now
  },
  staff_invitation: async ({ subjectId, now }, transaction) => {
    const asked = await StaffInvitation.findByPk(subjectId, { transaction })
    return asked !== null && !asked.acceptedAt && !asked.withdrawnAt && asked.expiresAt > now
  },
}

async function noticeIsOpen(
  { subjectId }: { subjectId: string },
  transaction: Transaction,
): Promise<boolean> {
  const answer = await NoticeAnswer.findByPk(subjectId, { attributes: ['answer', 'settledAt'], transaction })
  return answer !== null && answer.answer === null && answer.settledAt === null
}

/**
 * Whether what a queued mail says still holds. A reminder of a paid balance, an invitation to a run that takes no more
 * deposits or a link that no longer works is not sent. Kinds that report what has happened always hold.
 */
export async function isStillTrue(
  mail: { kind: string; subjectId: string; now: Date },
  transaction: Transaction,
): Promise<boolean> {
  const ask = QUESTIONS[mail.kind as MailKind]
  return ask ? ask(mail, transaction) : true
}
