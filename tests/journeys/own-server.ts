import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { type AddressInfo, connect, createServer, type Server, type Socket } from "node:net";
import { expect } from "@playwright/test";

/** A wire to a service that a test can cut and join again. */
export class CuttableWire {
  private server: Server | null = null;
  private readonly sockets = new Set<Socket>();
  private port = 0;

  constructor(private readonly target: URL) {}

  async join(): Promise<void> {
    this.server = createServer((near) => {
      const far = connect(Number(this.target.port), this.target.hostname);
      for (const socket of [near, far]) {
        this.sockets.add(socket);
        socket.on("error", () => {});
        socket.on("close", () => {
          this.sockets.delete(socket);
          near.destroy();
          far.destroy();
        });
      }
      near.pipe(far).pipe(near);
    });
    this.server.listen(this.port, "127.0.0.1");
    await once(this.server, "listening");
    this.port = (this.server.address() as AddressInfo).port;
  }

  async cut(): Promise<void> {
    const { server } = this;
    this.server = null;
    if (!server) return;
    const closed = once(server, "close");
    server.close();
    for (const socket of this.sockets) socket.destroy();
    await closed;
  }

  /** The service's address by way of this wire. */
  get address(): string {
    const url = new URL(this.target);
    url.port = String(this.port);
    return url.href.replace(/\/$/, "");
  }
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, "127.0.0.1");
  await once(server, "listening");
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, "close");
  return port;
}

/** A second server of the same build over the same data, whose services can be cut off and which may die. */
export class OwnServer {
  /** All it wrote, on both its streams. */
  output = "";
  private constructor(
    readonly process: ChildProcess,
    readonly port: number,
    readonly database: CuttableWire,
    readonly store: CuttableWire,
  ) {
    for (const stream of [process.stdout, process.stderr]) {
      stream?.on("data", (bytes: Buffer) => {
        this.output += bytes.toString();
      });
    }
  }

  static async start(): Promise<OwnServer> {
    const database = new CuttableWire(new URL(process.env.KEYPEG_DATABASE_URL ?? ""));
    const store = new CuttableWire(new URL(process.env.KEYPEG_S3_ENDPOINT ?? ""));
    await Promise.all([database.join(), store.join()]);
    const port = await freePort();
    const child = spawn(process.execPath, ["build-test/server.mjs"], {
      stdio: ["ignore", "pipe", "pipe"],
      env: {
        ...process.env,
        NODE_ENV: "production",
        PORT: String(port),
        KEYPEG_PUBLIC_ORIGIN: `http://127.0.0.1:${port}`,
        KEYPEG_DATABASE_URL: database.address,
        KEYPEG_S3_ENDPOINT: store.address,
      },
    });
    const server = new OwnServer(child, port, database, store);
    await expect.poll(() => server.output, { timeout: 30_000 }).toContain("listening");
    return server;
  }

  get origin(): string {
    return `http://127.0.0.1:${this.port}`;
  }

  /** Its exit code, once it is gone. */
  async exitCode(): Promise<number | null> {
    if (this.process.exitCode === null && this.process.signalCode === null) {
      await once(this.process, "exit");
    }
    return this.process.exitCode;
  }

  async end(): Promise<void> {
    this.process.kill("SIGKILL");
    await this.exitCode();
    await Promise.all([this.database.cut(), this.store.cut()]);
  }
}
