/** The one-time code that money deeds ask for. */
export const secondFactorWords = {
  title: 'One-time code',
  setUpLead:
    'Deeds that move other people’s money ask for a code from an authenticator on your phone. Set it up once.',
  giveLead: 'This deed moves money. Enter the code your authenticator shows now; it holds for 15 minutes.',
  scan: 'Point your authenticator at this square, or type the key by hand.',
  squareAlt: 'A square code that holds the key below',
  key: 'Key',
  code: 'Code',
  codeHint: 'Six digits; or one of your recovery codes.',
  go: 'Go on',
  wrong: 'This code does not match, or was used already. Wait for the next one and try again.',
  recovery: 'Recovery codes',
  recoveryLead:
    'Write these down and keep them away from your phone. Each works once, and they are not shown again after the first code.',
}
