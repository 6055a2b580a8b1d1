import { and, eq, isNull, sql } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { carriers, yards } from "../../db/schema/carriers";
import { audit, memberships } from "../../db/schema/people";
import type { Clock } from "../../services/clock";
import { writeChanges } from "../feed";
import { ok, type RefusalCode, type Result, refuse } from "../refusals";
import { Refused } from "../refused";

/** What a change of the carrier's people may say about itself while it runs. */
export class PeopleChange {
  private readonly notes: { action: string; subjectId: string; detail: unknown }[] = [];

  constructor(
    readonly tx: Db,
    readonly carrierId: string,
    readonly now: Date,
  ) {}

  deny(code: RefusalCode, more: Parameters<typeof refuse>[1] = {}): never {
    throw new Refused(refuse(code, more).refusal);
  }

  /** For the audit: what was done to whom. Never an address or a number. */
  note(action: string, subjectId: string, detail: unknown = null): void {
    this.notes.push({ action, subjectId, detail });
  }

  /** A yard of this carrier, or none; another carrier's is not found (K7). */
  async requireYard(yardId: string | null): Promise<void> {
    if (yardId === null) return;
    const [yard] = await this.tx
      .select({ id: yards.id })
      .from(yards)
      .where(and(eq(yards.carrierId, this.carrierId), eq(yards.id, yardId)));
    if (!yard) this.deny("not-found");
  }

  /** Somebody who still works here must be able to put this right. Call after the change. */
  async requireManager(): Promise<void> {
    const active = await this.tx
      .select({ roles: memberships.roles })
      .from(memberships)
      .where(and(eq(memberships.carrierId, this.carrierId), isNull(memberships.deactivatedAt)));
    if (!active.some(({ roles }) => roles.includes("manager"))) this.deny("last-manager");
  }

  async write(actorId: string | null): Promise<void> {
    const { carrierId, now } = this;
    if (this.notes.length === 0) return;
    await this.tx
      .insert(audit)
      .values(this.notes.map((note) => ({ ...note, carrierId, id: uuidv7(), at: now, actorId })));
    await writeChanges(
      this.tx,
      carrierId,
      now,
      this.notes.map(({ action, subjectId }) => ({ kind: action, subjectId })),
    );
  }
}

/**
 * Runs a change of who may do what. The carrier's row is written first, so that two such changes
 * happen one after the other, on any number of database nodes; audit and feed are written last.
 */
export async function changePeople<T>(
  db: Db,
  who: { carrierId: string; personId: string | null },
  clock: Clock,
  work: (change: PeopleChange) => Promise<T>,
): Promise<Result<T>> {
  const { carrierId } = who;
  try {
    const value = await inTransaction(db, async (tx) => {
      await tx
        .update(carriers)
        .set({ peopleSeq: sql`${carriers.peopleSeq} + 1` })
        .where(eq(carriers.id, carrierId));
      const change = new PeopleChange(tx, carrierId, clock.now());
      const done = await work(change);
      await change.write(who.personId);
      return done;
    });
    return ok(value);
  } catch (error) {
    if (error instanceof Refused) return { ok: false, refusal: error.refusal };
    throw error;
  }
}
