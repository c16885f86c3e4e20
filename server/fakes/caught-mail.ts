/** A mail as it arrived. */
export interface CaughtMail {
  to: string
  from: string
  subject: string
  text: string
  html: string
  messageId: string
  receivedAt: Date
}
