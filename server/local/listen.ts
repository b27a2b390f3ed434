import type { AddressInfo } from 'node:net';
import type { Server } from 'node:http';

/** A small service on loopback. */
export interface LocalService {
  readonly url: string;
  stop(): Promise<void>;
}

/** Listens on loopback only. @param port 0 takes any free one */
export function listen(server: Server, port: number): Promise<AddressInfo> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen({ port, host: '127.0.0.1' }, () => {
      const address = server.address();
      if (address === null || typeof address === 'string') reject(new Error('the service has no port'));
      else resolve(address);
    });
  });
}

export function close(server: Server): Promise<void> {
  return new Promise((resolve) => {
    server.close(() => resolve());
    server.closeAllConnections();
  });
}
