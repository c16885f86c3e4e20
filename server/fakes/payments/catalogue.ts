import type { Books } from './books.ts'
import { listed } from './books.ts'
import { groupOf, textOf, textsOf, wholeOf, type Form } from './form-body.ts'
import { invalidRequest } from './service-error.ts'
import type { Interval, Price, Product } from './shapes.ts'

export function createProduct({ state, id }: Books, form: Form): Product {
  const name = textOf(form, 'name')
  if (!name) throw invalidRequest('Missing required param: name.', 'name')
  const product: Product = { id: textOf(form, 'id') ?? id('prod'), object: 'product', name, active: true }
  return (state.products[product.id] = product)
}

export function createPrice({ state, id }: Books, form: Form): Price {
  const interval = textOf(groupOf(form, 'recurring'), 'interval')
  const amount = wholeOf(form, 'unit_amount')
  const currency = textOf(form, 'currency')
  if (interval !== 'month' && interval !== 'year') throw invalidRequest('Invalid recurring[interval]')
  if (amount === undefined || !(amount >= 0) || !currency)
    throw invalidRequest('Invalid unit_amount or currency')
  const price: Price = {
    id: id('price'),
    object: 'price',
    active: true,
    currency,
    unit_amount: amount,
    lookup_key: textOf(form, 'lookup_key') ?? null,
    product: textOf(form, 'product') ?? '',
    type: 'recurring',
    recurring: { interval: interval as Interval, interval_count: 1 },
  }
  return (state.prices[price.id] = price)
}

export function listPrices({ state }: Books, form: Form) {
  const keys = textsOf(form, 'lookup_keys')
  const found = Object.values(state.prices).filter(
    ({ active, lookup_key }) =>
      active && (keys.length === 0 || (lookup_key !== null && keys.includes(lookup_key))),
  )
  return listed('/v1/prices', found)
}

/** An empty service gets invented prices and two promotion codes, so that there is something to buy. */
export function stockCatalogue(books: Books): void {
  if (Object.keys(books.state.prices).length > 0) return
  const product = createProduct(books, { name: 'Underfoot seat (invented price)' })
  const price = { currency: 'eur', product: product.id }
  createPrice(books, {
    ...price,
    unit_amount: '450',
    recurring: { interval: 'month' },
    lookup_key: 'underfoot_seat_month',
  })
  createPrice(books, {
    ...price,
    unit_amount: '4500',
    recurring: { interval: 'year' },
    lookup_key: 'underfoot_seat_year',
  })
  books.state.promotions.push(
    { code: 'FIRST20', percentOff: 20, once: true },
    { code: 'ALWAYS10', percentOff: 10, once: false },
  )
}
