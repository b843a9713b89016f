/** A page of plain sections: a heading, then paragraphs; an entry that is a list is shown as one. */
export type LegalText = {
  title: string
  lead: string
  sections: readonly { heading: string; body: readonly (string | readonly string[])[] }[]
}

/** What holds for this site as such; each workshop's own terms stand on its pages. */
export const terms: LegalText = {
  title: 'Terms of this site',
  lead: 'Brimline is a tool makers use to sell small runs. Who sells to you is the workshop, by its own terms.',
  sections: [
    {
      heading: 'Who you buy from',
      body: [
        'Every module is sold by a workshop in its own name, on its own account at the payment provider. The workshop’s name, postal address and terms stand on each of its pages. This site is not a party to that contract.',
      ],
    },
    {
      heading: 'Interest, deposit, order',
      body: [
        [
          'Registering interest is free and binds nobody. It counts once you have confirmed it by mail, and you can take it back at any time by the link in those mails.',
          'An order with a deposit is one contract, conditional on the run being locked. Price, postage, tax and the promised date are fixed for that order when you place it, and shown before.',
          'Before the lock you can cancel with two clicks and get everything back.',
          'If a run is called off, or nobody decides within seven days of the decide-by date, every deposit is paid back in full.',
        ],
        'Deposits stay in the workshop’s balance at the payment provider and are not paid out to it before the run is locked. This is no trust account and no insurance.',
      ],
    },
    {
      heading: 'Your rights',
      body: [
        'Consumers in the European Union and the United Kingdom may withdraw at any time until 14 days after the last piece arrived. Nothing here takes away a right your local law gives you. This page is no legal advice.',
      ],
    },
    {
      heading: 'What workshops agree to',
      body: [
        'A workshop says truthfully who it is, sells what it can build, and keeps to the dates and refunds it promised. The host of this site opens workshops and may suspend one; that stops new orders only. Paying back, cancelling and writing to buyers go on.',
        'Rules on product safety, radio interference, waste, packaging and tax differ by country. Each workshop is responsible for those that apply to it.',
      ],
    },
  ],
}

export const privacy: LegalText = {
  title: 'Privacy',
  lead: 'What is stored about you, what for, who sees it, and when it goes.',
  sections: [
    {
      heading: 'When you only read',
      body: [
        'Pages load nothing from anybody else and set no cookie. There is no counting of visitors and no advertising. A link to a video leads to another site only when you follow it.',
      ],
    },
    {
      heading: 'When you register interest',
      body: [
        'We store your e-mail address, the form and number you want, the country, how sure you are and, where the price is open, the highest price you named. The workshop sees how many people said what, in its planning; the public sees counts only.',
        'What you do not confirm is deleted after 14 days. What you take back no longer counts.',
      ],
    },
    {
      heading: 'When you order',
      body: [
        'We store your name and address for the parcel, what you ordered and what was paid. The workshop needs them to fulfil the contract and to keep its books; its packers see addresses, its bench sees neither addresses nor money.',
        'Card data never reach this site: you enter them at the payment provider (Stripe), which handles them under its own rules. We store the brand and last four digits of the card, so that you know which one a balance is charged to.',
      ],
    },
    {
      heading: 'When you sign in',
      body: [
        'You get a link by mail that works for ten minutes. One cookie keeps you signed in, another remembers the browser that asked; both belong to this site alone.',
      ],
    },
    {
      heading: 'Forms that come back',
      body: [
        'What you typed into a form that needs changing waits for 15 minutes so that nothing is lost, then it goes. Codes and card data are never kept there.',
      ],
    },
    {
      heading: 'Mails',
      body: [
        'We write about what you asked for and what an order needs. News and invitations carry a link that stops them at one click. We remember that wish under a fingerprint of your address, also after the address itself is gone.',
      ],
    },
    {
      heading: 'Your choices',
      body: [
        'You may ask what is stored about you, have it corrected, taken along or erased. Write to the workshop you dealt with; its addresses stand on its pages and under its mails. What the law obliges it to keep, such as invoices, stays until that time is over.',
      ],
    },
  ],
}

export const accessibility: LegalText = {
  title: 'Accessibility',
  lead: 'Everyone should be able to follow a run, order and be paid back, with whatever they use to read and to type.',
  sections: [
    {
      heading: 'What we aim for',
      body: [
        'These pages are built to meet the Web Content Accessibility Guidelines 2.2 at level AA.',
        [
          'Everything works by keyboard alone, with the focus always in sight.',
          'Pages fit a width of 320 pixels without scrolling sideways, and text can be enlarged.',
          'Every drawing has a sentence and a table that say the same.',
          'A state is never shown by colour alone.',
          'Forms work without JavaScript; what needs changing is listed on top and stands at its field.',
          'Light and dark follow your system; nothing moves if you ask for less motion.',
        ],
      ],
    },
    {
      heading: 'What we know is not good yet',
      body: [
        'The page on which you enter your card belongs to the payment provider; we cannot change it. Prices for another country are shown before ordering, but choosing the country on the module page needs JavaScript.',
      ],
    },
    {
      heading: 'If something stops you',
      body: [
        'Write to the workshop whose page it is; its addresses stand on the page. Say what you were doing and what you use. You can also order, cancel or ask for a refund by writing to the workshop.',
      ],
    },
  ],
}
