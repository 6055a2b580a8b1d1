import type { ReactNode } from "react";
import { Form } from "react-router";
import { uiText } from "~/text/en/ui";
import { Button } from "./button";
import { PageFrame } from "./page-frame";

/** The page frame of a signed-in person: the places they may enter, their account, the way out. */
export function PlaceFrame({
  frame,
  wide,
  children,
}: {
  /** Null where not even that could be read. */
  frame: { name: string; carrier: string; places: { to: string; label: string }[] } | null;
  wide?: boolean;
  children: ReactNode;
}) {
  if (!frame) return <PageFrame wide={wide}>{children}</PageFrame>;
  const { name, carrier, places } = frame;
  return (
    <PageFrame
      wide={wide}
      places={places}
      person={{ name, carrier, to: "/account" }}
      out={
        <Form method="post" action="/sign-out">
          <Button type="submit">{uiText.signOut}</Button>
        </Form>
      }
    >
      {children}
    </PageFrame>
  );
}
