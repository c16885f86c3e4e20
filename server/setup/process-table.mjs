import { readFileSync } from 'node:fs'

/**
 * What the kernel says of a process, from its third field on (the name before it may hold spaces): state, parent
 * and so forth. See proc(5).
 * @param {number} pid
 */
function fieldsOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')
  } catch {
    return undefined
  }
}

/**
 * When a live process began, in clock ticks since the machine did: with its number, this names it for good.
 * @param {number} pid
 */
export function beganAt(pid) {
  const fields = fieldsOf(pid)
  return fields?.[0] === 'Z' ? undefined : fields?.[19]
}

/** @param {number} pid */
export function parentOf(pid) {
  return Number(fieldsOf(pid)?.[1])
}

/**
 * Signals a whole process group; one that is gone already is no error.
 * @param {number} pid of its leader
 * @param {NodeJS.Signals} signal
 */
export function killGroup(pid, signal) {
  try {
    process.kill(-pid, signal)
  } catch {
    // It ended by itself in the meantime.
  }
}
