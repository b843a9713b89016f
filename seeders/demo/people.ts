/** The demo's people who are not just one of many; everybody at an address that cannot exist. */
export const PEOPLE = {
  host: 'host@brimline.example',
  mara: 'mara@hollow-pier.brimline.example',
  jonas: 'jonas@hollow-pier.brimline.example',
  lene: 'lene@hollow-pier.brimline.example',
  gwen: 'gwen@fen-lamp.brimline.example',
} as const
