import sharp from "sharp";

/** A picture drawn here: noise, so that its bytes are its own. */
export async function drawnPicture(
  more: { width?: number; height?: number; format?: "jpeg" | "png" | "webp" | "gif" } = {},
): Promise<Uint8Array> {
  const { width = 64, height = 48, format = "jpeg" } = more;
  const noise = { type: "gaussian" as const, mean: 128, sigma: 40 };
  const background = { r: 120, g: 90, b: 40 };
  const drawn = sharp({ create: { width, height, channels: 3, background, noise } });
  return drawn.toFormat(format).toBuffer();
}
