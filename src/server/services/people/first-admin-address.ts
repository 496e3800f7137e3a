import { closeDb } from '../../db/connection'
import { firstAdminAddress } from './set-up-shop'

/** Prints the one-time address for making the first admin, or nothing where there is one. Run by the start. */
const address = await firstAdminAddress()
if (address) process.stdout.write(`${address}\n`)
await closeDb()
