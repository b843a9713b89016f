import 'server-only'

/** Other names the columns of a parts list go by, in small letters without signs. Common practice, no source. */
const NAMES: Readonly<Record<string, readonly string[]>> = {
  code: ['code', 'part', 'partnumber', 'partno', 'partcode', 'item', 'mpn', 'ordercode', 'articlenumber'],
  description: ['description', 'desc', 'name', 'text'],
  value: ['value', 'val', 'comment'],
  designators: ['designators', 'designator', 'reference', 'references', 'ref', 'refs', 'refdes'],
  per_unit: ['perunit', 'qty', 'quantity', 'qtyperunit', 'count', 'amount', 'pcs'],
  breaks: ['breaks', 'pricebreaks', 'prices', 'price', 'unitprice'],
  supplier: ['supplier', 'vendor', 'distributor'],
  supplier_code: ['suppliercode', 'suppliernumber', 'sku', 'vendorcode'],
  lead_days: ['leaddays', 'leadtime', 'leadtimedays'],
  quoted_on: ['quotedon', 'quotedate', 'date', 'quoted'],
  stock_seen: ['stockseen', 'stock', 'available', 'instock'],
  stock_seen_on: ['stockseenon', 'stockdate'],
  moq: ['moq', 'minimum', 'minorder', 'leastsold'],
  multiple: ['multiple', 'packsize', 'soldin', 'mult'],
  lifecycle: ['lifecycle', 'status'],
  attrition_percent: ['attritionpercent', 'attrition', 'loss'],
}

const plain = (name: string) => name.toLowerCase().replaceAll(/[^a-z0-9]+/g, '')

/**
 * Our heading for each column of a file, '' where none fits; each heading is taken by the first column that fits it. A
 * column that is called as ours is comes before one that only means it.
 */
export function matchColumns(headings: readonly string[], ours: readonly string[]): string[] {
  const found = headings.map((heading) => ours.find((own) => plain(own) === plain(heading)) ?? '')
  const taken = new Set(found.filter((own) => own !== ''))
  return found.map((own, i) => {
    if (own !== '') return found.indexOf(own) === i ? own : ''
    const meant = ours.find((each) => !taken.has(each) && NAMES[each]?.includes(plain(headings[i] ?? '')))
    if (meant) taken.add(meant)
    return meant ?? ''
  })
}
