import { existsSync } from 'node:fs'

const setpriv = '/usr/bin/setpriv'

/**
 * The words before a command that let the kernel signal it when its starter dies, even by `kill -9`: no
 * process is left behind. Debian has the program; elsewhere the command runs as it is.
 * @param {string} signal
 */
export function endsWithStarter(signal) {
  return existsSync(setpriv) ? [setpriv, '--pdeathsig', signal] : []
}
