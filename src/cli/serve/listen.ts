import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'

/** Listens on this machine alone; the port that was taken. Rejects where it is not free. */
export function listen(server: Server, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, '127.0.0.1', () => {
      server.off('error', reject)
      resolve((server.address() as AddressInfo).port)
    })
  })
}

/** Listens on the wanted port, or on any free one where it is taken. */
export async function listenNear(server: Server, port: number): Promise<number> {
  try {
    return await listen(server, port)
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'EADDRINUSE') return await listen(server, 0)
    throw error
  }
}
