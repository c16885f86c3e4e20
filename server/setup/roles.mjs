import { onDatabase } from './database-urls.mjs'

/**
 * The roles of the product. The owner migrates; web and worker own nothing; `underfoot_identity` is what both
 * turn into for a statement on people and sign-ins, and NOINHERIT keeps its rights apart until they do.
 */
const loginRoles = { owner: 'underfoot_owner', web: 'underfoot_web', worker: 'underfoot_worker' }
const identityRole = 'underfoot_identity'

/** @typedef {{ owner: string, web: string, worker: string }} OfRoles one text for each role that signs in */

/**
 * Makes the roles where they are missing and sets their passwords.
 * @param {string} adminUrl
 * @param {OfRoles} passwords hexadecimal
 */
export async function makeRoles(adminUrl, passwords) {
  await onDatabase(adminUrl, async (admin) => {
    const { rows } = await admin.query('select rolname from pg_roles')
    const there = new Set(rows.map((row) => row.rolname))
    if (!there.has(identityRole)) await admin.query(`create role ${identityRole} nologin`)
    for (const key of /** @type {const} */ (['owner', 'web', 'worker'])) {
      const verb = there.has(loginRoles[key]) ? 'alter' : 'create'
      await admin.query(`${verb} role ${loginRoles[key]} login noinherit password '${passwords[key]}'`)
    }
    await admin.query(`grant ${identityRole} to ${loginRoles.web}, ${loginRoles.worker}`)
  })
}

/**
 * Makes a database of the owner's where it is missing.
 * @param {string} adminUrl
 * @param {string} name
 * @param {string} [template] the database to copy, which nobody may be using
 */
export async function makeDatabase(adminUrl, name, template = 'template1') {
  await onDatabase(adminUrl, async (admin) => {
    const { rowCount } = await admin.query('select 1 from pg_database where datname = $1', [name])
    if (!rowCount) await admin.query(`create database ${name} template ${template} owner ${loginRoles.owner}`)
  })
}

/**
 * Makes one thing for each role that signs in.
 * @template T
 * @param {(role: string, key: keyof OfRoles) => T} make
 * @returns {{ owner: T, web: T, worker: T }}
 */
export function forEachRole(make) {
  return {
    owner: make(loginRoles.owner, 'owner'),
    web: make(loginRoles.web, 'web'),
    worker: make(loginRoles.worker, 'worker'),
  }
}
