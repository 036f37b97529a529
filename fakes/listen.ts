import { createServer, type RequestListener, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'

/** Serves on 127.0.0.1 only. Port 0 takes a free one. Rejects when the port is taken. */
export async function listen(app: RequestListener, port: number): Promise<{ server: Server; port: number }> {
  const server = createServer(app)
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, '127.0.0.1', resolve)
  })
  return { server, port: (server.address() as AddressInfo).port }
}

/** Stops listening and ends every connection, also those kept alive. */
export async function closeServer(server: Server): Promise<void> {
  await new Promise<void>(resolve => {
    server.close(() => resolve())
    server.closeAllConnections()
  })
}
