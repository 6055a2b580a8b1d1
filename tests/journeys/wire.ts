import { once } from "node:events";
import { connect, type Socket } from "node:net";

/** A connection on which a test writes each byte itself. */
export class Wire {
  received = "";
  closed = false;
  private constructor(readonly socket: Socket) {
    socket.on("data", (bytes) => {
      this.received += bytes.toString("latin1");
    });
    // A reset is an end like any other here; what came before it is in `received`.
    socket.on("error", () => {});
    socket.on("close", () => {
      this.closed = true;
    });
  }

  static async open(origin: string): Promise<Wire> {
    const { hostname, port } = new URL(origin);
    const socket = connect(Number(port), hostname);
    await once(socket, "connect");
    return new Wire(socket);
  }

  send(...lines: string[]): void {
    this.socket.write(`${lines.join("\r\n")}\r\n\r\n`);
  }

  /** The status of the last answer that is whole up to its headers; 0 before. */
  get status(): number {
    return Number(this.received.match(/HTTP\/1\.1 (\d{3})[\s\S]*?\r\n\r\n/)?.[1] ?? 0);
  }
}
