import { expect, test } from 'vitest'
import { mailboxOf } from '@/lib/gateways/mailer/sender-address'

test.each([
  ['Brimline <post@brimline.example>', { name: 'Brimline', address: 'post@brimline.example' }],
  [
    '"Brimline, by hand" <post@brimline.example>',
    { name: 'Brimline, by hand', address: 'post@brimline.example' },
  ],
  ['<post@brimline.example>', { name: '', address: 'post@brimline.example' }],
  [' post@brimline.example ', { name: '', address: 'post@brimline.example' }],
])('reads %s', (setting, mailbox) => {
  expect(mailboxOf(setting)).toEqual(mailbox)
})

test.each(['', 'Brimline', 'a@b, c@d', 'Brimline <post>'])(
  'a setting that is no sender throws: %s',
  (setting) => {
    expect(() => mailboxOf(setting)).toThrow(RangeError)
  },
)
