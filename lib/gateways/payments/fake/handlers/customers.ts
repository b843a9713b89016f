import 'server-only'
import type Stripe from 'stripe'
import { insert, load, newId } from '@/lib/gateways/payments/fake/books'
import { missing } from '@/lib/gateways/payments/fake/errors'
import { emit } from '@/lib/gateways/payments/fake/events'
import { listObjects } from '@/lib/gateways/payments/fake/list-objects'
import { newCustomer } from '@/lib/gateways/payments/fake/objects/payer'
import { LIST_PARAMS } from '@/lib/gateways/payments/fake/handlers/lists'
import { type Call, route } from '@/lib/gateways/payments/fake/route'

async function createCustomer({ books, params }: Call): Promise<Stripe.Customer> {
  const customer = newCustomer({
    id: await newId(books, 'customer'),
    now: books.now,
    email: params.optional('email') ?? null,
    name: params.optional('name') ?? null,
    metadata: params.map('metadata'),
  })
  await insert(books, 'customer', customer, { hidden: {} })
  await emit(books, 'customer.created', customer)
  return customer
}

async function retrieveMethod({ books, id, childId }: Call): Promise<Stripe.PaymentMethod> {
  const method = await load(books, 'payment_method', childId)
  if (method.customer !== id) throw missing('payment_method', childId)
  return method
}

/** Customers and their saved methods. */
export const CUSTOMERS = [
  route<Stripe.Customer>('post', '/v1/customers', { known: ['email', 'name', 'metadata.*'] }, createCustomer),
  route<Stripe.Customer>('get', '/v1/customers/:id', { known: [] }, ({ books, id }) =>
    load(books, 'customer', id),
  ),
  route<Stripe.ApiList<Stripe.Customer>>(
    'get',
    '/v1/customers',
    { known: [...LIST_PARAMS, 'email'] },
    ({ books, params, path }) => listObjects(books, 'customer', path, params, ['email']),
  ),
  route<Stripe.PaymentMethod>(
    'get',
    '/v1/customers/:id/payment_methods/:child',
    { known: [] },
    retrieveMethod,
  ),
]
