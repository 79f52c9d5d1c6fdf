import { createServer } from 'node:net'

/**
 * Whether something could listen on a loopback port now.
 *
 * @param {number} port 0 asks for any
 * @returns {Promise<number | undefined>} the port, or undefined when it is taken
 */
export function tryPort(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const server = createServer()
    server.once('error', () => resolve(undefined))
    server.listen({ port, host, exclusive: true }, () => {
      const found = server.address().port
      server.close(() => resolve(found))
    })
  })
}
