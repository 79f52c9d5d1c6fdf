import type { LoadFigure } from './receiptQueries'

/**
 * Address of the page that explains a line of the loads ahead.
 *
 * @example loadReceiptHref('p', { code: '17 02 01', year: 2030, containerM3: 20, payloadT: 12 }) // => '/load-receipt?publication=p&code=17+02+01&year=2030&container=20&payload=12'
 */
export function loadReceiptHref(publicationId: string, { code, year, containerM3, payloadT }: LoadFigure): string {
  const query = new URLSearchParams({
    publication: publicationId,
    code,
    year: String(year),
    container: String(containerM3),
    payload: String(payloadT),
  })
  return `/load-receipt?${query.toString()}`
}
