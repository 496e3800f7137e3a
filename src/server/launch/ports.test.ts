import { createServer } from 'node:net'
import { expect, it } from 'vitest'
import { assertPortFree, findFreePort } from './ports'

it('refuses a port that another program holds, by its number', async () => {
  const other = createServer()
  const port = await new Promise<number>((resolve) => {
    other.listen(0, '127.0.0.1', () => {
      const address = other.address()
      resolve(typeof address === 'object' && address ? address.port : 0)
    })
  })
  await expect(assertPortFree('127.0.0.1', port)).rejects.toThrow(`port ${port} on 127.0.0.1 is taken`)
  await new Promise((resolve) => other.close(resolve))
  await expect(assertPortFree('127.0.0.1', port)).resolves.toBeUndefined()
})

it('finds a port that can be listened on', async () => {
  await expect(assertPortFree('127.0.0.1', await findFreePort())).resolves.toBeUndefined()
})
