import type { PlacedContact } from '../events/contacts.ts'
import type { Contact } from '../types.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { heightOfFlight } from './jump.ts'
import { forceOf, type TrialModel } from './trial-model.ts'

/** What is measured of one contact and the flight after it. */
export interface MeasuredContact {
  touchdown: Quantity
  takeoff: Quantity
  contactTime: Quantity
  flightTime: Quantity
  height: Quantity
  rsi: Quantity
  rsiFlightContact: Quantity
  peakForce: Quantity
}

/** Times, height and RSI of a contact from the instants of its touchdown, its takeoff and the next touchdown. */
export function measureContact(
  model: TrialModel,
  { peak }: PlacedContact,
  touchdown: Quantity,
  takeoff: Quantity,
  landing: Quantity,
): MeasuredContact {
  const { budget } = model
  const contactTime = budget.minus(takeoff, touchdown)
  const flightTime = budget.minus(landing, takeoff)
  const height = heightOfFlight(model, flightTime)
  return {
    touchdown,
    takeoff,
    contactTime,
    flightTime,
    height,
    rsi: budget.over(height, contactTime),
    rsiFlightContact: budget.over(flightTime, contactTime),
    peakForce: forceOf(model, peak.value, peak.position, peak.valueU),
  }
}

/** Whether a contact is short enough for a rebound. */
export function isRebound({ settings }: TrialModel, { contactTime }: MeasuredContact): boolean {
  return contactTime.value <= settings.longestCountedContactS
}

/** A contact as it leaves the engine. */
export function contactOut(
  { budget }: TrialModel,
  { touchdown, takeoff, contactTime, flightTime, height, rsi, rsiFlightContact, peakForce }: MeasuredContact,
  counted: boolean,
): Contact {
  return {
    touchdownS: touchdown.value,
    takeoffS: takeoff.value,
    contactTime: budget.figure(contactTime),
    flightTime: budget.figure(flightTime),
    height: budget.figure(height),
    rsi: budget.figure(rsi),
    rsiFlightContact: budget.figure(rsiFlightContact),
    peakForce: budget.figure(peakForce),
    counted,
  }
}
