import type { Model, ModelStatic } from 'sequelize'
import { Address } from './address'
import { BulkItem } from './bulk-item'
import { BulkJob } from './bulk-job'
import { Choice } from './choice'
import { ChoiceAnswer } from './choice-answer'
import { Decision } from './decision'
import { Destination } from './destination'
import { Dispute } from './dispute'
import { Invitation } from './invitation'
import { Invoice } from './invoice'
import { LedgerEntry } from './ledger-entry'
import { LedgerTransfer } from './ledger-transfer'
import { Lesson } from './lesson'
import { MailOutbox } from './mail-outbox'
import { Membership } from './membership'
import { Module } from './module'
import { Notice } from './notice'
import { NoticeAnswer } from './notice-answer'
import { Offer } from './offer'
import { Order } from './order'
import { OrderChange } from './order-change'
import { OrderLine } from './order-line'
import { PackBatch } from './pack-batch'
import { Parcel } from './parcel'
import { ParcelLine } from './parcel-line'
import { Part } from './part'
import { PaymentAttempt } from './payment-attempt'
import { Person } from './person'
import { Plan } from './plan'
import { PostageService } from './postage-service'
import { PostageZone } from './postage-zone'
import { Problem } from './problem'
import { Question } from './question'
import { Quote } from './quote'
import { QuoteBreak } from './quote-break'
import { RecoveryCode } from './recovery-code'
import { Refund } from './refund'
import { Revision } from './revision'
import { RevisionLine } from './revision-line'
import { Run } from './run'
import { RunOffer } from './run-offer'
import { RunUpdate } from './run-update'
import { Session } from './session'
import { SignUp } from './sign-up'
import { StockMove } from './stock-move'
import { TermsVersion } from './terms-version'
import { Unit } from './unit'
import { User } from './user'
import { Waiver } from './waiver'
import { Workshop } from './workshop'

type Pair = [
  parent: ModelStatic<Model>,
  children: string | null,
  child: ModelStatic<Model>,
  key: string,
  back: string | null,
]

/** Who has many of whom: parent, name of the list on it, child, its key, name of the parent on the child. */
const MANY: Pair[] = [
  [Workshop, 'modules', Module, 'workshopId', 'workshop'],
  [Workshop, 'memberships', Membership, 'workshopId', 'workshop'],
  [Person, 'memberships', Membership, 'personId', 'person'],
  [User, 'sessions', Session, 'userId', 'user'],
  [User, 'recoveryCodes', RecoveryCode, 'userId', null],
  [Module, 'revisions', Revision, 'moduleId', 'module'],
  [Module, 'offers', Offer, 'moduleId', 'module'],
  [Module, 'runs', Run, 'moduleId', 'module'],
  [Module, 'lessons', Lesson, 'moduleId', null],
  [Module, 'signups', SignUp, 'moduleId', 'module'],
  [Module, 'questions', Question, 'moduleId', 'module'],
  [Offer, 'choices', Choice, 'offerId', 'offer'],
  [Offer, 'destinations', Destination, 'offerId', null],
  [Choice, 'answers', ChoiceAnswer, 'choiceId', 'choice'],
  [PostageZone, 'services', PostageService, 'zoneId', 'zone'],
  [Workshop, 'runs', Run, 'workshopId', 'workshop'],
  [Revision, 'runs', Run, 'revisionId', 'revision'],
  [Revision, 'lines', RevisionLine, 'revisionId', 'revision'],
  [Run, 'offers', RunOffer, 'runId', 'run'],
  [Run, 'orders', Order, 'runId', 'run'],
  [Run, 'invitations', Invitation, 'runId', 'run'],
  [Run, 'waivers', Waiver, 'runId', null],
  [Run, 'decisions', Decision, 'runId', null],
  [Run, 'updates', RunUpdate, 'runId', 'run'],
  [Run, 'notices', Notice, 'runId', 'run'],
  [Run, 'plans', Plan, 'runId', null],
  [TermsVersion, null, Run, 'termsVersionId', 'termsVersion'],
  [TermsVersion, null, Order, 'termsVersionId', 'termsVersion'],
  [Offer, 'runOffers', RunOffer, 'offerId', 'offer'],
  [Offer, 'signups', SignUp, 'offerId', 'offer'],
  [Person, 'signups', SignUp, 'personId', 'person'],
  [SignUp, 'invitations', Invitation, 'signupId', 'signup'],
  [Person, 'invitations', Invitation, 'personId', 'person'],
  [Workshop, 'orders', Order, 'workshopId', 'workshop'],
  [Person, 'orders', Order, 'personId', 'person'],
  [Address, null, Order, 'addressId', 'address'],
  [Order, 'lines', OrderLine, 'orderId', 'order'],
  [Order, 'changes', OrderChange, 'orderId', 'order'],
  [Order, 'attempts', PaymentAttempt, 'orderId', 'order'],
  [Order, 'refunds', Refund, 'orderId', 'order'],
  [Order, 'invoices', Invoice, 'orderId', 'order'],
  [Order, 'problems', Problem, 'orderId', 'order'],
  [Order, 'disputes', Dispute, 'orderId', 'order'],
  [Order, 'noticeAnswers', NoticeAnswer, 'orderId', 'order'],
  [RunOffer, 'lines', OrderLine, 'runOfferId', 'runOffer'],
  [OrderLine, 'parcelLines', ParcelLine, 'orderLineId', 'orderLine'],
  [PaymentAttempt, 'refunds', Refund, 'attemptId', 'attempt'],
  [LedgerTransfer, 'entries', LedgerEntry, 'transferId', 'transfer'],
  [Parcel, 'lines', ParcelLine, 'parcelId', 'parcel'],
  [Person, 'parcels', Parcel, 'personId', 'person'],
  [Address, null, Parcel, 'addressId', 'address'],
  [Run, 'parcels', Parcel, 'runId', 'run'],
  [PostageService, null, Parcel, 'serviceId', 'service'],
  [PackBatch, 'parcels', Parcel, 'batchId', 'batch'],
  [Person, null, PackBatch, 'packerPersonId', 'packer'],
  [Unit, 'parcelLines', ParcelLine, 'unitId', 'unit'],
  [OrderLine, 'units', Unit, 'orderLineId', 'orderLine'],
  [Revision, 'units', Unit, 'revisionId', 'revision'],
  [Part, 'revisionLines', RevisionLine, 'partId', 'part'],
  [Part, 'quotes', Quote, 'partId', 'part'],
  [Part, 'stockMoves', StockMove, 'partId', 'part'],
  [Quote, 'breaks', QuoteBreak, 'quoteId', null],
  [Notice, 'answers', NoticeAnswer, 'noticeId', 'notice'],
  [BulkJob, 'items', BulkItem, 'bulkJobId', 'job'],
  [Person, 'mails', MailOutbox, 'personId', 'person'],
  [Workshop, 'mails', MailOutbox, 'workshopId', 'workshop'],
]

const ALL = new Set(MANY.flatMap(([parent, , child]) => [parent, child]))

// A hot reload runs this file again over the same models, and an alias may be given once only.
for (const model of ALL) for (const alias of Object.keys(model.associations)) delete model.associations[alias]

for (const [parent, children, child, foreignKey, back] of MANY) {
  if (children) parent.hasMany(child, { as: children, foreignKey })
  if (back) child.belongsTo(parent, { as: back, foreignKey })
}
Person.hasOne(User, { as: 'user', foreignKey: 'personId' })
User.belongsTo(Person, { as: 'person', foreignKey: 'personId' })
