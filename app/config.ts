import { isIP } from "node:net";
import { z } from "zod";

/** Secrets that stand in the project for everyone to read: good for the demo, for nothing else. */
const DEMO_SECRETS = new Set(["keypeg-demo-secret-known-to-everyone", "S3RVER"]);

/** Where http is as good as https: nothing leaves the machine. */
const LOOPBACK = new Set(["127.0.0.1", "localhost", "[::1]"]);

const port = "must be a port, a number up to 65535";
const proxies = z
  .string()
  .transform((list) => list.split(",").map((one) => one.trim()))
  .transform((list) => list.filter((one) => one !== ""))
  .refine((list) => list.every((one) => isIP(one) > 0), "must be IP addresses with commas between");

const environment = z.object({
  KEYPEG_DATABASE_URL: z.url({ protocol: /^mysql$/ }),
  KEYPEG_S3_ENDPOINT: z.url({ protocol: /^https?$/ }),
  KEYPEG_S3_PUBLIC_ENDPOINT: z.url({ protocol: /^https?$/ }).optional(),
  KEYPEG_S3_REGION: z.string().min(1).default("us-east-1"),
  KEYPEG_S3_BUCKET: z.string().min(3),
  KEYPEG_S3_ACCESS_KEY_ID: z.string().min(1),
  KEYPEG_S3_SECRET_ACCESS_KEY: z.string().min(1),
  KEYPEG_SMTP_URL: z.url({ protocol: /^smtps?$/ }),
  KEYPEG_MAIL_FROM: z.string().min(3),
  KEYPEG_SECRET: z.string().min(32, "must have at least 32 characters"),
  KEYPEG_PUBLIC_ORIGIN: z.url({ protocol: /^https?$/ }),
  KEYPEG_DEMO: z.enum(["0", "1"]).default("0"),
  KEYPEG_LOG_LEVEL: z.enum(["debug", "info", "warn", "error", "silent"]).default("info"),
  KEYPEG_TRUSTED_PROXIES: proxies.default([]),
  HOST: z.string().min(1).default("127.0.0.1"),
  PORT: z.coerce.number(port).int(port).min(0, port).max(65_535, port).default(4180),
});

export interface Config {
  databaseUrl: string;
  s3: {
    endpoint: string;
    publicEndpoint: string;
    region: string;
    bucket: string;
    accessKeyId: string;
    secretAccessKey: string;
  };
  smtpUrl: string;
  mailFrom: string;
  secret: string;
  publicOrigin: string;
  demo: boolean;
  logLevel: string;
  listen: { host: string; port: number; trustedProxies: readonly string[] };
}

/** Thrown with one line for each value that is missing or wrong. */
export class ConfigError extends Error {
  override name = "ConfigError";
}

/** Reads the environment. Every fault is named at once; demo secrets are refused in production. */
export function readConfig(env: Record<string, string | undefined>): Config {
  const parsed = environment.safeParse(env);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => {
      const name = String(issue.path[0]);
      return env[name] === undefined ? `${name} is not set` : `${name}: ${issue.message}`;
    });
    throw new ConfigError(`The environment is not complete:\n  ${lines.join("\n  ")}`);
  }
  const e = parsed.data;
  const demo = e.KEYPEG_DEMO === "1";
  const known = (["KEYPEG_SECRET", "KEYPEG_S3_SECRET_ACCESS_KEY"] as const).filter((name) =>
    DEMO_SECRETS.has(e[name]),
  );
  if (known.length > 0 && !demo && env.NODE_ENV === "production") {
    const lines = known.map((name) => `${name} is the demo's, which everyone may read`);
    throw new ConfigError(`Set secrets of your own outside the demo:\n  ${lines.join("\n  ")}`);
  }
  const { protocol, hostname } = new URL(e.KEYPEG_PUBLIC_ORIGIN);
  const open = protocol === "http:" && !LOOPBACK.has(hostname);
  if (open && !demo && env.NODE_ENV === "production") {
    // Without TLS whoever is on the way reads the session's cookie.
    throw new ConfigError("KEYPEG_PUBLIC_ORIGIN must begin with https:// outside the demo");
  }
  return {
    databaseUrl: e.KEYPEG_DATABASE_URL,
    s3: {
      endpoint: e.KEYPEG_S3_ENDPOINT,
      publicEndpoint: e.KEYPEG_S3_PUBLIC_ENDPOINT ?? e.KEYPEG_S3_ENDPOINT,
      region: e.KEYPEG_S3_REGION,
      bucket: e.KEYPEG_S3_BUCKET,
      accessKeyId: e.KEYPEG_S3_ACCESS_KEY_ID,
      secretAccessKey: e.KEYPEG_S3_SECRET_ACCESS_KEY,
    },
    smtpUrl: e.KEYPEG_SMTP_URL,
    mailFrom: e.KEYPEG_MAIL_FROM,
    secret: e.KEYPEG_SECRET,
    publicOrigin: new URL(e.KEYPEG_PUBLIC_ORIGIN).origin,
    demo,
    logLevel: e.KEYPEG_LOG_LEVEL,
    listen: { host: e.HOST, port: e.PORT, trustedProxies: e.KEYPEG_TRUSTED_PROXIES },
  };
}

let read: Config | null = null;

/** The process's configuration, read on first use. */
export function config(): Config {
  read ??= readConfig(process.env);
  return read;
}
