import type { Request } from 'express'
import {
  changeSeats,
  endSubscription,
  getBilling,
  listPlans,
  openPortal,
  previewSeats,
  refreshBilling,
  startCheckout,
  takePaymentEvent,
} from '../../../shared/contracts/billing.ts'
import { implement, implementPublic, type Route } from '../../http/implement.ts'
import { signatureInvalid } from '../../integrations/payments/payment-errors.ts'
import { readBilling, refresh } from './billing.service.ts'
import { preview, setEnding, setSeats } from './change.service.ts'
import { openCheckout, openPortal as openPortalPage, readPlans } from './checkout.service.ts'
import { takeEvent } from './events.service.ts'

/** One request of a person is one request to the service, however often it is sent. */
const serviceKey = (req: Request, clubId: string) => `${clubId}-${req.get('Idempotency-Key') ?? ''}`

export const billingRoutes: Route[] = [
  implement(getBilling, ({ deps, ctx }) => readBilling(deps, ctx)),
  implement(listPlans, ({ deps }) => readPlans(deps)),
  implement(startCheckout, ({ deps, ctx, body, req }) =>
    openCheckout(deps, ctx, body, serviceKey(req, ctx.clubId)),
  ),
  implement(previewSeats, ({ deps, ctx, query }) => preview(deps, ctx, query.seats)),
  implement(changeSeats, ({ deps, ctx, body, req }) =>
    setSeats(deps, ctx, body, serviceKey(req, ctx.clubId)),
  ),
  implement(endSubscription, ({ deps, ctx, body, req }) =>
    setEnding(deps, ctx, body, serviceKey(req, ctx.clubId)),
  ),
  implement(openPortal, ({ deps, ctx }) => openPortalPage(deps, ctx)),
  implement(refreshBilling, ({ deps, ctx }) => refresh(deps, ctx)),
  implementPublic(takePaymentEvent, async ({ deps, body, req }) => {
    if (!(body instanceof Uint8Array)) throw signatureInvalid()
    await takeEvent(deps, body, req.get('Stripe-Signature') ?? '')
    return null
  }),
]
