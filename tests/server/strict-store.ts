import { createServer, request as open, type Server } from "node:http";

/** What the object store does with the next requests. */
export type StoreMood =
  | "well"
  /** 503 to everything. */
  | "away"
  /** Says 200 to a PUT and keeps nothing. */
  | "forgets"
  /** Keeps what was sent, and hands back something else. */
  | "garbles"
  /** Promises a body and never sends it. */
  | "stalls"
  /** Hangs up half way. */
  | "hangs-up";

/** An object store that can be in a bad mood, before the stand-in that only knows the good one. */
export class StrictStore {
  mood: StoreMood = "well";
  readonly put: string[] = [];
  private server: Server | null = null;

  constructor(private readonly behind: string) {}

  async start(): Promise<string> {
    const server = createServer((asked, answer) => {
      if (asked.method === "PUT") this.put.push(asked.url ?? "");
      if (this.mood === "hangs-up") {
        asked.socket.destroy();
        return;
      }
      if (this.mood === "stalls") {
        answer.writeHead(200, { "Content-Length": "9" }).flushHeaders();
        return;
      }
      const refuses = this.mood === "away" || (this.mood === "forgets" && asked.method === "PUT");
      if (refuses) {
        asked.resume();
        asked.on("end", () => {
          answer.writeHead(this.mood === "away" ? 503 : 200, { "Content-Length": "0" }).end();
        });
        return;
      }
      const garbles = this.mood === "garbles" && asked.method === "GET";
      const { hostname, port } = new URL(this.behind);
      const { method, url: path, headers } = asked;
      const through = open({ hostname, port, method, path, headers }, (back) => {
        if (garbles) {
          back.resume();
          answer.writeHead(200, { "Content-Length": "3" }).end("not");
          return;
        }
        answer.writeHead(back.statusCode ?? 502, back.headers);
        back.pipe(answer);
      });
      through.on("error", () => answer.destroy());
      asked.pipe(through);
    });
    this.server = server;
    await new Promise<void>((ready) => server.listen(0, "127.0.0.1", ready));
    const address = server.address();
    if (address === null || typeof address === "string") throw new Error("no port");
    return `http://127.0.0.1:${address.port}`;
  }

  async stop(): Promise<void> {
    this.server?.closeAllConnections();
    await new Promise<void>((closed) => this.server?.close(() => closed()));
  }
}
