const tsx = ['--import', 'tsx']
const tsxWatch = ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false']

/**
 * The processes of the product, as `keepRunning` takes them.
 * @typedef {import('./processes.mjs').Service} Service
 */

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {boolean} reload
 * @returns {Service}
 */
export function webService(env, reload) {
  const args = [...(reload ? tsxWatch : tsx), 'server/main.ts']
  return { name: 'web', args, env: { ...env, CLIENT: reload ? 'vite' : 'built' }, showOutput: reload }
}

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {boolean} reload
 * @returns {Service}
 */
export function workerService(env, reload) {
  return { name: 'worker', args: [...(reload ? tsxWatch : tsx), 'server/worker.ts'], env, showOutput: reload }
}

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {{ smtpPort: number, inboxPort: number }} ports
 * @returns {Service}
 */
export function mailService(env, { smtpPort, inboxPort }) {
  const ports = { MAIL_CATCHER_SMTP_PORT: String(smtpPort), MAIL_CATCHER_INBOX_PORT: String(inboxPort) }
  return {
    name: 'mail',
    args: [...tsx, 'server/fakes/main.ts'],
    env: { ...env, ...ports },
    showOutput: false,
  }
}
