import type { SlipLanguage } from '@/lib/core/post/slip-language'

type SlipWords = {
  name: string
  order: (number: string) => string
  parcel: (nth: number, of: number) => string
  replacement: string
  from: string
  to: string
  ownScriptLeftOut: string
  columns: { quantity: string; thing: string }
  serials: (list: readonly string[]) => string
  more: string
  problem: string
  noInvoice: string
  offers: Readonly<Record<'boards' | 'kit' | 'built', string>>
}

/** The fixed words of a packing slip, in the languages it speaks to buyers. What people typed stays as they typed it. */
export const SLIP_WORDS: Readonly<Record<SlipLanguage, SlipWords>> = {
  en: {
    name: 'Packing slip',
    order: (number) => `Order ${number}`,
    parcel: (nth, of) => (of === 1 ? 'The whole order' : `Parcel ${nth} of ${of}`),
    replacement: 'Replacement',
    from: 'From',
    to: 'To',
    ownScriptLeftOut:
      'The address in the buyer’s own script is on the screen; this paper has no letters for it.',
    columns: { quantity: 'Quantity', thing: 'What' },
    serials: (list) => `${list.length === 1 ? 'Serial number' : 'Serial numbers'} ${list.join(', ')}`,
    more: 'The rest of the order comes in another parcel.',
    problem: 'Something missing, damaged or faulty? Tell us here:',
    noInvoice: 'This is not an invoice.',
    offers: { boards: 'PCB and front panel set', kit: 'kit', built: 'built and tested' },
  },
  de: {
    name: 'Packzettel',
    order: (number) => `Bestellung ${number}`,
    parcel: (nth, of) => (of === 1 ? 'Die ganze Bestellung' : `Paket ${nth} von ${of}`),
    replacement: 'Ersatz',
    from: 'Von',
    to: 'An',
    ownScriptLeftOut: 'Die Anschrift in eigener Schrift steht am Bildschirm; hier fehlen die Zeichen dafür.',
    columns: { quantity: 'Anzahl', thing: 'Was' },
    serials: (list) => `${list.length === 1 ? 'Seriennummer' : 'Seriennummern'} ${list.join(', ')}`,
    more: 'Der Rest der Bestellung kommt in einem weiteren Paket.',
    problem: 'Fehlt etwas, ist etwas beschädigt oder defekt? Hier melden:',
    noInvoice: 'Dies ist keine Rechnung.',
    offers: { boards: 'Platinen und Frontplatte', kit: 'Bausatz', built: 'aufgebaut und geprüft' },
  },
  fr: {
    name: 'Bon de colisage',
    order: (number) => `Commande ${number}`,
    parcel: (nth, of) => (of === 1 ? 'La commande entière' : `Colis ${nth} sur ${of}`),
    replacement: 'Remplacement',
    from: 'De',
    to: 'À',
    ownScriptLeftOut:
      'L’adresse dans votre écriture est à l’écran ; ce papier n’a pas les caractères qu’il faut.',
    columns: { quantity: 'Quantité', thing: 'Article' },
    serials: (list) => `${list.length === 1 ? 'Numéro de série' : 'Numéros de série'} ${list.join(', ')}`,
    more: 'Le reste de la commande arrive dans un autre colis.',
    problem: 'Il manque quelque chose, un objet est abîmé ou en panne ? Dites-le-nous ici :',
    noInvoice: 'Ceci n’est pas une facture.',
    offers: { boards: 'circuits et façade', kit: 'kit à monter', built: 'monté et testé' },
  },
  es: {
    name: 'Nota de embalaje',
    order: (number) => `Pedido ${number}`,
    parcel: (nth, of) => (of === 1 ? 'El pedido completo' : `Paquete ${nth} de ${of}`),
    replacement: 'Reposición',
    from: 'De',
    to: 'Para',
    ownScriptLeftOut: 'La dirección en su escritura está en la pantalla; este papel no tiene esas letras.',
    columns: { quantity: 'Cantidad', thing: 'Artículo' },
    serials: (list) => `${list.length === 1 ? 'Número de serie' : 'Números de serie'} ${list.join(', ')}`,
    more: 'El resto del pedido llega en otro paquete.',
    problem: '¿Falta algo, está dañado o no funciona? Díganoslo aquí:',
    noInvoice: 'Esto no es una factura.',
    offers: { boards: 'placas y panel frontal', kit: 'kit para montar', built: 'montado y probado' },
  },
}
