import { type Write } from '@/emails/_letter'
import { balanceComing } from '@/emails/balance-coming'
import { balancePaid } from '@/emails/balance-paid'
import { balanceReminder } from '@/emails/balance-reminder'
import { cardNeedsYou } from '@/emails/card-needs-you'
import { changeNotice } from '@/emails/change-notice'
import { confirmSignup } from '@/emails/confirm-signup'
import { delayNotice } from '@/emails/delay-notice'
import { depositReceived } from '@/emails/deposit-received'
import { depositsOpen } from '@/emails/deposits-open'
import { orderCancelled } from '@/emails/order-cancelled'
import { orderLapsed } from '@/emails/order-lapsed'
import { ownerDigest } from '@/emails/owner-digest'
import { ownerReminder } from '@/emails/owner-reminder'
import { parcelHandedOver } from '@/emails/parcel-handed-over'
import { placeFree } from '@/emails/place-free'
import { placeReleased } from '@/emails/place-released'
import { problemAnswered } from '@/emails/problem-answered'
import { problemOpened } from '@/emails/problem-opened'
import { refundSent } from '@/emails/refund-sent'
import { runCalledOff } from '@/emails/run-called-off'
import { runChanged } from '@/emails/run-changed'
import { runLocked } from '@/emails/run-locked'
import { runUpdate } from '@/emails/run-update'
import { signInLink } from '@/emails/sign-in-link'
import { signupConfirmed } from '@/emails/signup-confirmed'
import { staffInvitation } from '@/emails/staff-invitation'
import { withdrawalAcknowledged } from '@/emails/withdrawal-acknowledged'
import { type MailKind } from '@/lib/contracts/mails'

/** Which file writes which kind. */
export const LETTERS: { readonly [K in MailKind]: Write<K> } = {
  confirm_signup: confirmSignup,
  signup_confirmed: signupConfirmed,
  deposits_open: depositsOpen,
  deposit_received: depositReceived,
  place_released: placeReleased,
  place_free: placeFree,
  run_locked: runLocked,
  run_called_off: runCalledOff,
  run_changed: runChanged,
  balance_coming: balanceComing,
  balance_paid: balancePaid,
  card_needs_you: cardNeedsYou,
  balance_reminder: balanceReminder,
  order_lapsed: orderLapsed,
  run_update: runUpdate,
  delay_notice: delayNotice,
  change_notice: changeNotice,
  parcel_handed_over: parcelHandedOver,
  problem_opened: problemOpened,
  problem_answered: problemAnswered,
  withdrawal_acknowledged: withdrawalAcknowledged,
  refund_sent: refundSent,
  order_cancelled: orderCancelled,
  sign_in_link: signInLink,
  staff_invitation: staffInvitation,
  owner_digest: ownerDigest,
  owner_reminder: ownerReminder,
}
