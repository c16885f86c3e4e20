import type { ServerResponse } from 'node:http'
import { checkoutOf } from '../books.ts'
import { giveCard, takeSecondStep } from '../checkout.ts'
import { parseForm, textOf, type Form } from '../form-body.ts'
import { changeCard, payInvoice } from '../portal.ts'
import { ServiceError } from '../service-error.ts'
import type { PaymentService } from '../payment-service.ts'
import { checkoutPage, secondStepPage } from './checkout-page.ts'
import { controlPage } from './control-page.ts'
import { page } from './html.ts'
import { invoicePage, portalPage } from './portal-page.ts'

interface PageRequest {
  method: string
  path: string
  form: string
}

/** The pages that a person sees: checkout, portal, invoice, and the control of this service itself. */
export async function answerPage(
  service: PaymentService,
  { method, path, form }: PageRequest,
  res: ServerResponse,
): Promise<void> {
  const [, kind = '', id = ''] = path.split('/')
  const given = method === 'POST' ? parseForm(form) : null
  try {
    const answer = await answerOf(service, kind, id, given)
    service.save()
    if (answer.to) res.writeHead(303, { location: answer.to }).end()
    else res.writeHead(200, { 'content-type': 'text/html; charset=utf-8' }).end(answer.html)
  } catch (error) {
    if (!(error instanceof ServiceError)) throw error
    res.writeHead(error.status, { 'content-type': 'text/html; charset=utf-8' }).end(page(error.message, ''))
  }
}

interface PageAnswer {
  html?: string
  /** Another address to go to. */
  to?: string
}

async function answerOf(
  service: PaymentService,
  kind: string,
  id: string,
  given: Form | null,
): Promise<PageAnswer> {
  const { books } = service
  if (kind === 'checkout') return given ? pay(service, id, given) : { html: checkoutPage(books, id) }
  if (kind === 'portal') {
    const said = given ? changeCard(books, id, textOf(given, 'number') ?? '') : undefined
    await service.delivery.send()
    return { html: portalPage(books, id, said) }
  }
  if (kind === 'invoices') {
    const said = given ? payInvoice(books, id) : undefined
    await service.delivery.send()
    return { html: invoicePage(books, id, said) }
  }
  if (kind === 'control' && given) await control(service, id, given)
  return given ? { to: '/' } : { html: controlPage(books) }
}

async function pay(service: PaymentService, id: string, given: Form): Promise<PageAnswer> {
  const { books, delivery } = service
  const second = textOf(given, 'second')
  const step =
    second === undefined
      ? giveCard(books, id, {
          number: textOf(given, 'number') ?? '',
          promotion: textOf(given, 'promotion') ?? '',
          taxId: textOf(given, 'taxId') ?? '',
        })
      : takeSecondStep(books, id, second === 'yes')
  if (step.step === 'again') return { html: checkoutPage(books, id, step.problem) }
  if (step.step === 'second') return { html: secondStepPage() }
  await delivery.send()
  return { to: checkoutOf(books, id).success_url }
}

async function control(service: PaymentService, act: string, given: Form): Promise<void> {
  const { delivery, faults } = service
  if (act === 'advance') await service.advance(Number(textOf(given, 'days') ?? 0))
  const kind = textOf(given, 'kind')
  if (act === 'fault' && (kind === 'error' || kind === 'time-out')) faults.push({ kind, of: '' })
  if (act !== 'delivery') return
  const how = textOf(given, 'how')
  if (how === 'twice' || how === 'once') delivery.twice = how === 'twice'
  delivery.hold = how === 'hold'
  delivery.reversed = how === 'reversed'
  await delivery.send()
  delivery.reversed = false
}
