import { isApiError, type AnyErrorCode } from '../api/api-error.ts'

export interface ErrorWording {
  /** What happened, as a heading. */
  title: string
  /** What to do about it. */
  advice: string
}

/** The client's wording of every code; complete by type, so a new code does not compile without its words. */
export const errorWording: Record<AnyErrorCode, ErrorWording> = {
  'invalid-request': {
    title: 'Some of the entries are not valid',
    advice: 'Correct what is marked and send it again. Nothing was saved.',
  },
  'not-signed-in': { title: 'You are not signed in', advice: 'Sign in to go on from here.' },
  'wrong-credentials': {
    title: 'E-mail address and password do not match',
    advice: 'Check both and try again, or set a new password.',
  },
  'not-allowed': {
    title: 'Your role does not allow this',
    advice: 'If you need it for your work, ask a club admin for the role.',
  },
  'not-found': {
    title: 'There is nothing here',
    advice:
      'It may have been moved, or it belongs to somebody else. Check the address, or go back to the start.',
  },
  'stale-version': {
    title: 'Somebody changed this while you had it open',
    advice: 'Look at what changed, then decide. Nothing of yours was saved yet.',
  },
  'idempotency-key-missing': {
    title: 'The page could not number this request',
    advice: 'Load the page again and repeat what you did. Nothing was saved.',
  },
  'idempotency-key-reused': {
    title: 'This was sent before with other content',
    advice: 'Load the page again, check what was saved, and repeat what is missing.',
  },
  'still-running': {
    title: 'The first request is still being processed',
    advice: 'Wait a few seconds, then try again. Nothing will be done twice.',
  },
  'too-many-requests': {
    title: 'Too many tries in a short time',
    advice: 'Wait a few minutes, then try again.',
  },
  'cross-site-request': {
    title: 'The request seems to come from another site',
    advice: 'Open Underfoot at its own address and repeat it there. Nothing was saved.',
  },
  'token-invalid': {
    title: 'This link no longer works',
    advice: 'A new link for a password comes from the sign-in page, a new invitation from your club’s admin.',
  },
  'email-taken': {
    title: 'Somebody of the club has this e-mail address already',
    advice: 'Use another address, or change the roles of the person who has it.',
  },
  'name-taken': { title: 'This name is taken', advice: 'Choose another name.' },
  'last-admin': {
    title: 'The club needs at least one active admin',
    advice: 'Make somebody else an admin first.',
  },
  'already-invited': {
    title: 'This address has an open invitation',
    advice: 'Send that invitation again, or withdraw it first.',
  },
  'athlete-already-linked': {
    title: 'Another person already signs in as this athlete',
    advice: 'Choose another athlete, or deactivate the other person first.',
  },
  'file-too-large': { title: 'The file is too large', advice: 'Split the recording, or export it again.' },
  'file-name-invalid': {
    title: 'The file’s name cannot be used',
    advice: 'Rename the file without slashes or control characters and add it again.',
  },
  'chunk-invalid': {
    title: 'A piece of the file arrived damaged',
    advice: 'Send the file again; what arrived whole is kept.',
  },
  'upload-incomplete': {
    title: 'Parts of the file are missing',
    advice: 'Send the file again; what arrived is kept, only the rest is sent.',
  },
  'upload-finished': {
    title: 'This upload is finished already',
    advice: 'Look for the file in the session. To send another, add it as a new file.',
  },
  'upload-dismissed': {
    title: 'This file was dismissed while it was on its way',
    advice: 'Take it back under “Show dismissed” in the Tray, or try again to send it anew.',
  },
  'too-many-uploads': {
    title: 'Too many of your files are only half here',
    advice: 'Send their rest or dismiss them in the Trays of your sessions, then add this one again.',
  },
  'upload-in-use': {
    title: 'This file cannot be dismissed now',
    advice: 'Wait until it is here and read. Trials of it are set aside on the sheet.',
  },
  'nothing-to-publish': {
    title: 'There is nothing to publish yet',
    advice: 'Put at least one analysed trial on an athlete and leave it included, then publish.',
  },
  'athlete-not-in-session': {
    title: 'This athlete is not in the session',
    advice: 'Choose an athlete of the session’s squads.',
  },
  'event-misplaced': {
    title: 'An event cannot stand where it was put',
    advice: 'Move it to where it can, then save. Nothing was saved yet.',
  },
  'engine-outdated': {
    title: 'The engine was renewed while you had this open',
    advice: 'Note where you put the event, load the page again and move it there. Nothing was saved.',
  },
  'recompute-running': {
    title: 'A recompute is under way',
    advice: 'Wait until it has ended, or cancel it in the club’s settings, then try again.',
  },
  'nothing-to-recompute': {
    title: 'There is nothing to recompute',
    advice: 'Every analysis here was made with what holds now.',
  },
  'payments-off': {
    title: 'Nothing can be bought here',
    advice: 'No payment service is set up. Ask whoever runs this installation.',
  },
  'payments-away': {
    title: 'The payment service did not answer',
    advice: 'Wait a moment, look at what this page shows, then try again. Nothing is charged twice.',
  },
  'payment-declined': {
    title: 'The card was declined',
    advice: 'Nothing was changed. Give another card under “Card and invoices”, then try again.',
  },
  'signature-invalid': {
    title: 'This did not come from the payment service',
    advice: 'Check the signing secret of the events in the settings of this installation.',
  },
  'subscription-running': {
    title: 'The club has a subscription already',
    advice: 'Change its seats on the billing page instead of buying a second one.',
  },
  'subscription-missing': {
    title: 'The club has no running subscription',
    advice: 'Buy one on the billing page first.',
  },
  'athlete-unseated': {
    title: 'This athlete has no seat',
    advice:
      'The recording is kept in the Tray. A club admin gives seats on the Seats page; then put it on the athlete.',
  },
  'club-reads-only': {
    title: 'The club can only read at the moment',
    advice: 'Nothing is lost. An admin of the club restores everything on the billing page.',
  },
  internal: {
    title: 'Something went wrong on our side',
    advice: 'Try again in a moment. If it goes on, tell whoever runs Underfoot at your club.',
  },
  'no-answer': {
    title: 'The server cannot be reached',
    advice: 'Check the connection, then try again. What you typed is still here.',
  },
  'answer-unreadable': {
    title: 'The answer could not be understood',
    advice: 'The page may be older than the server. Load it again.',
  },
}

/** The words for anything that was thrown. */
export function wordingOf(error: unknown): ErrorWording {
  return errorWording[isApiError(error) ? error.code : 'internal']
}
