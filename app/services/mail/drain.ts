import { and, asc, eq, isNull, lte, sql } from "drizzle-orm";
import { CODE_LASTS } from "../../auth/codes/issue-code";
import { config } from "../../config";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { mailOutbox, memberships, people } from "../../db/schema/people";
import { minutes, seconds } from "../../domain/durations";
import { type Clock, systemClock } from "../clock";
import { type Mail, sendMail } from "../mail-transport";
import { HOLDS_SECRET } from "./mail-props";

const TRIES = 8;
const SEND_WITHIN = seconds(15);
/** A claimed mail is left alone this long, whatever becomes of who claimed it. */
const CLAIM = minutes(2);
const IDLE = seconds(1);

type Waiting = typeof mailOutbox.$inferSelect;

export interface DrainTools {
  send: (mail: Mail) => Promise<void>;
  origin: string;
  clock: Clock;
}

/** Claims the mail that has waited longest, in a transaction of its own: nothing is sent inside it. */
async function claim(db: Db, now: Date): Promise<Waiting | null> {
  return inTransaction(db, async (tx) => {
    const [row] = await tx
      .select()
      .from(mailOutbox)
      .where(
        and(isNull(mailOutbox.sentAt), isNull(mailOutbox.failedAt), lte(mailOutbox.sendAfter, now)),
      )
      .orderBy(asc(mailOutbox.sendAfter))
      .limit(1)
      .for("update", { skipLocked: true });
    if (!row) return null;
    await tx
      .update(mailOutbox)
      .set({ tries: sql`${mailOutbox.tries} + 1`, sendAfter: new Date(now.getTime() + CLAIM) })
      .where(eq(mailOutbox.id, row.id));
    return { ...row, tries: row.tries + 1 };
  });
}

/** Why a mail must not go at all, or null. A code goes only to somebody who works here, and in time. */
async function whyNotSend(db: Db, mail: Waiting, now: Date): Promise<string | null> {
  if (mail.template !== "sign-in-code") return null;
  if (mail.createdAt.getTime() + CODE_LASTS <= now.getTime()) return "expired";
  const [reader] = await db
    .select({ id: people.id })
    .from(people)
    .innerJoin(
      memberships,
      and(eq(memberships.personId, people.id), isNull(memberships.deactivatedAt)),
    )
    .where(eq(people.email, mail.recipient))
    .limit(1);
  return reader ? null : "unknown-address";
}

/** What went wrong, without the addresses a mail server likes to repeat. */
function faultOf(error: unknown): string {
  if (!(error instanceof Error)) return "unknown";
  const code = "code" in error ? String(error.code) : error.name;
  const answer = "responseCode" in error ? ` ${String(error.responseCode)}` : "";
  return `${code}${answer}`.slice(0, 190);
}

/** Seconds, then minutes: 10 s, 20 s, 40 s … at most half an hour, with jitter. */
function backoff(tries: number): number {
  return Math.min(minutes(30), seconds(5) * 2 ** tries) * (0.75 + Math.random() / 2);
}

async function within<T>(ms: number, work: Promise<T>): Promise<T> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new Error("late")), ms);
  });
  return Promise.race([work, late]).finally(() => clearTimeout(timer));
}

async function deliver(mail: Waiting, tools: DrainTools): Promise<void> {
  // Loaded when the first mail goes: the mail kit is large and most processes never need it at start.
  const { renderMail } = await import("./render-mail");
  const rendered = await renderMail(mail.template, mail.props, tools.origin);
  const messageId = `<${mail.id}@${new URL(tools.origin).hostname}>`;
  await within(SEND_WITHIN, tools.send({ to: mail.recipient, messageId, ...rendered }));
}

/** Sends one waiting mail. False when none waits. A mail that fails waits longer each time, eight times. */
export async function drainOne(db: Db, tools: DrainTools): Promise<boolean> {
  const mail = await claim(db, tools.clock.now());
  if (!mail) return false;
  const write = (set: Partial<typeof mailOutbox.$inferInsert>) =>
    db.update(mailOutbox).set(set).where(eq(mailOutbox.id, mail.id));
  const blank = HOLDS_SECRET[mail.template] ? { props: {} } : {};
  const refused = await whyNotSend(db, mail, tools.clock.now());
  if (refused) {
    const now = tools.clock.now();
    await write({ ...blank, recipient: "", failedAt: now, lastError: refused });
    return true;
  }
  try {
    await deliver(mail, tools);
    await write({ ...blank, sentAt: tools.clock.now(), lastError: null });
  } catch (error) {
    const now = tools.clock.now();
    const lastError = faultOf(error);
    if (mail.tries >= TRIES) await write({ ...blank, failedAt: now, lastError });
    else await write({ sendAfter: new Date(now.getTime() + backoff(mail.tries)), lastError });
  }
  return true;
}

export interface MailDrain {
  stop(): Promise<void>;
}

/** Sends what waits, one mail at a time, and looks again every second. */
export function startMailDrain(
  db: Db,
  onError: (error: unknown) => void,
  tools: DrainTools = { send: sendMail, origin: config().publicOrigin, clock: systemClock },
): MailDrain {
  let stopped = false;
  let wake = () => {};
  const rest = () =>
    new Promise<void>((resolve) => {
      const timer = setTimeout(resolve, IDLE);
      wake = () => {
        clearTimeout(timer);
        resolve();
      };
    });
  const run = async () => {
    while (!stopped) {
      const sent = await drainOne(db, tools).catch((error) => {
        onError(error);
        return false;
      });
      if (!sent && !stopped) await rest();
    }
  };
  const running = run();
  return {
    stop: async () => {
      stopped = true;
      wake();
      await running;
    },
  };
}
