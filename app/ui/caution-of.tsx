import { cautions } from "~/text/en/cautions";
import type { CautionKey } from "~/trade/sheet/cautions";
import { Caution } from "./caution";

/** One of the trade's cautions, with its sign and its words. */
export function CautionOf({ name }: { name: CautionKey }) {
  const { shape, title, text } = cautions[name];
  return (
    <Caution shape={shape} title={title}>
      {text}
    </Caution>
  );
}
