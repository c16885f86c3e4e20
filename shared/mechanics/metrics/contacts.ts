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

/**
 * Times, height and RSI of a contact from the instants of its touchdown, its takeoff and the next touchdown. What the
 * recorder delays a takeoff by more than a touch, `recorder`, lengthens the contact and shortens the flight.
 */
export function measureContact(
  model: TrialModel,
  { peak }: PlacedContact,
  touchdown: Quantity,
  takeoff: Quantity,
  landing: Quantity,
  recorder: Quantity,
): MeasuredContact {
  const { budget } = model
  const contactTime = budget.plus(budget.minus(takeoff, touchdown), recorder)
  const flightTime = budget.minus(budget.minus(landing, takeoff), recorder)
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
