import type { ComponentProps } from 'react'
import { Link, type LinkProps } from 'react-router-dom'
import { classNames } from '../lib/class-names.ts'

/** `main`: the one main action of a page or form. `stop`: takes something away. `word`: inside a row or sentence. */
export type ButtonLook = 'main' | 'plain' | 'stop' | 'word'

const lookClass: Record<ButtonLook, string> = {
  main: 'button button-main',
  plain: 'button',
  stop: 'button button-stop',
  word: 'button button-word',
}

interface ButtonProps extends ComponentProps<'button'> {
  look?: ButtonLook
  /** While the act runs: stays focusable, says so to assistive technology, and ignores further presses. */
  busy?: boolean
}

export function Button({
  look = 'plain',
  busy = false,
  className,
  type = 'button',
  onClick,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={busy ? 'button' : type}
      aria-disabled={busy || undefined}
      className={classNames(lookClass[look], className)}
      onClick={busy ? undefined : onClick}
    />
  )
}

interface ButtonLinkProps extends LinkProps {
  look?: ButtonLook
}

/** A link that looks like a button: it goes somewhere, it does not act. */
export function ButtonLink({ look = 'plain', className, ...rest }: ButtonLinkProps) {
  return <Link {...rest} className={classNames(lookClass[look], className)} />
}
