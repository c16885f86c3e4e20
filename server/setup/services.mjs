const tsx = ['--import', 'tsx']
const tsxWatch = ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false']

/**
 * The processes of the product, as `keepRunning` takes them.
 * @typedef {import('./processes.mjs').Service} Service
 */

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {number} port
 * @param {boolean} reload
 * @returns {Service}
 */
export function webService(env, port, reload) {
  const args = [...(reload ? tsxWatch : tsx), 'server/main.ts']
  return { name: 'web', args, env: { ...env, PORT: String(port) }, showOutput: reload }
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
 * @param {{ smtpPort: number, pagePort: number }} ports
 * @returns {Service}
 */
export function mailService(env, { smtpPort, pagePort }) {
  const ports = { MAIL_CATCHER_SMTP_PORT: String(smtpPort), MAIL_CATCHER_PAGE_PORT: String(pagePort) }
  return {
    name: 'mail',
    args: [...tsx, 'server/fakes/main.ts'],
    env: { ...env, ...ports },
    showOutput: false,
  }
}

/**
 * Vite's own server, which passes what the web process answers on to it.
 * @param {NodeJS.ProcessEnv} env
 * @param {number} port
 * @param {number} webPort
 * @returns {Service}
 */
export function viteService(env, port, webPort) {
  const args = ['node_modules/vite/bin/vite.js', '--port', String(port), '--clearScreen', 'false']
  return { name: 'vite', args, env: { ...env, WEB_PORT: String(webPort) }, showOutput: true }
}
