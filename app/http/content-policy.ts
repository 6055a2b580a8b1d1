import { config } from "../config";

/** The object store's origin, which pictures come from after a redirect. Empty while building. */
function pictureOrigin(): string {
  return process.env.KEYPEG_S3_ENDPOINT ? new URL(config().s3.publicEndpoint).origin : "";
}

/** Security headers of a rendered page. `scripts` are the inline scripts' nonce or hashes. */
export function contentPolicy(scripts: readonly string[]): Record<string, string> {
  const secure = process.env.KEYPEG_PUBLIC_ORIGIN?.startsWith("https:") ?? false;
  const policy = [
    "default-src 'self'",
    `script-src 'self' ${scripts.join(" ")}`.trim(),
    "style-src 'self'",
    "style-src-attr 'unsafe-inline'",
    `img-src 'self' data: blob: ${pictureOrigin()}`.trim(),
    "font-src 'self'",
    "connect-src 'self'",
    "frame-ancestors 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "object-src 'none'",
  ];
  return {
    "Content-Security-Policy": policy.join("; "),
    "X-Content-Type-Options": "nosniff",
    "Referrer-Policy": "same-origin",
    "Permissions-Policy": "camera=(self), geolocation=(), microphone=()",
    ...(secure && { "Strict-Transport-Security": "max-age=31536000; includeSubDomains" }),
  };
}

/** The same for a page made at build time: its inline scripts are known by hash. */
export function pagePolicy(hashes: readonly string[]): Record<string, string> {
  return contentPolicy(hashes);
}
