import { once } from 'node:events';
import { connect, createServer, type AddressInfo, type Server, type Socket } from 'node:net';

/** A wire between a program and a server, to be cut, or to fall silent, as a network does. */
export class Wire {
  private server: Server | null = null;
  private port = 0;
  private silent = false;
  private readonly sockets = new Set<Socket>();

  private constructor(private readonly to: { host: string; port: number }) {}

  /** @param url of the server that it leads to */
  static async to(url: string): Promise<Wire> {
    const { hostname, port } = new URL(url);
    const wire = new Wire({ host: hostname, port: Number(port) });
    await wire.mend();
    return wire;
  }

  /** The same address by way of the wire. */
  by(url: string): string {
    const through = new URL(url);
    through.hostname = '127.0.0.1';
    through.port = String(this.port);
    return through.href;
  }

  /** Everything on it breaks off, and nobody gets in. */
  async cut(): Promise<void> {
    const { server } = this;
    if (!server) return;
    this.server = null;
    server.close();
    for (const socket of this.sockets) socket.destroy();
    await once(server, 'close');
  }

  /** Connections stay and nothing comes through, either way. */
  silence(): void {
    this.silent = true;
    for (const socket of this.sockets) socket.pause();
  }

  async mend(): Promise<void> {
    this.silent = false;
    for (const socket of this.sockets) socket.resume();
    if (this.server) return;
    this.server = createServer((near) => this.join(near)).listen(this.port, '127.0.0.1');
    await once(this.server, 'listening');
    this.port = (this.server.address() as AddressInfo).port;
  }

  private join(near: Socket): void {
    const far = connect(this.to);
    for (const [from, to] of [
      [near, far],
      [far, near],
    ] as const) {
      this.sockets.add(from);
      from.on('data', (bytes) => to.write(bytes));
      from.on('error', () => to.destroy());
      from.on('close', () => {
        this.sockets.delete(from);
        to.destroy();
      });
      if (this.silent) from.pause();
    }
  }
}
