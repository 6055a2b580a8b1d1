import type { ReactNode } from "react";

/** Drawings of what air goes through, on a 48 by 48 field with the pipe at mid-height. */
export const PART_SHAPES = {
  tank: (
    <path d="M6 14h36a4 4 0 0 1 4 4v14a4 4 0 0 1-4 4H6a4 4 0 0 1-4-4V18a4 4 0 0 1 4-4ZM14 14v22M34 14v22M22 14V8h8v6" />
  ),
  shutoff: (
    <>
      <path d="M10 4h28v36a4 4 0 0 1-4 4H14a4 4 0 0 1-4-4ZM16 12h16" />
      <circle cx="24" cy="27" r="8" />
    </>
  ),
  trap: <path d="M8 6h32v24l-9 10H17L8 30ZM20 40v5M28 40v5M8 30h32" />,
  filter: <path d="M10 8h28v32H10ZM17 8v32M24 8v32M31 8v32" />,
  valve: <path d="M4 10v28l20-14ZM44 10v28L24 24ZM24 24V8M15 8h18" />,
  pump: (
    <>
      <circle cx="24" cy="24" r="20" />
      <circle cx="27" cy="24" r="11" />
      <path d="M27 13V4.5M18 18l-8-7M18 30l-8 7M27 35v8.5M36.5 29l6 3.5" />
    </>
  ),
  catch: <path d="M8 8h32v26a8 8 0 0 1-8 8H16a8 8 0 0 1-8-8ZM8 30c5-4 9 4 16 0s11 4 16 0" />,
  can: <path d="M10 12h28v30H10ZM16 12V6h16v6M17 21h1M24 27h1M31 21h1M17 34h1M31 34h1" />,
  gauge: (
    <>
      <circle cx="24" cy="24" r="19" />
      <path d="m24 24-9-9M24 8v4M8 24h4M36 24h4" />
    </>
  ),
  relief: <path d="M16 44V30h16v14M12 30h24M24 30v-4l-6-3 12-4-12-4 6-3V6M16 6h16" />,
  outlet: <path d="M2 30h20a8 8 0 0 0 8-8V6M2 42h22a18 18 0 0 0 18-18V6M26 6h20" />,
} as const satisfies Record<string, ReactNode>;

export type PartShape = keyof typeof PART_SHAPES;
