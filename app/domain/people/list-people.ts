import { and, asc, eq, gt, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { invitations, memberships, people } from "../../db/schema/people";
import type { Actor, Role } from "../actor";
import { ok, type Result, refuse } from "../refusals";
import { thatMember } from "./that-member";

export interface Member {
  personId: string;
  name: string;
  email: string;
  phone: string | null;
  roles: Role[];
  certifier: boolean;
  onCall: number | null;
  yardId: string | null;
  yardName: string | null;
  active: boolean;
}

export interface OpenInvitation {
  id: string;
  name: string;
  email: string;
  roles: Role[];
  expiresAt: Date;
}

export interface PeopleList {
  members: Member[];
  invitations: OpenInvitation[];
}

function selectMembers(db: Db) {
  return db
    .select({
      personId: people.id,
      name: people.name,
      email: people.email,
      phone: people.phone,
      roles: memberships.roles,
      certifier: memberships.certifier,
      onCall: memberships.onCallOrder,
      yardId: memberships.yardId,
      yardName: yards.name,
      deactivatedAt: memberships.deactivatedAt,
    })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .leftJoin(
      yards,
      and(eq(yards.carrierId, memberships.carrierId), eq(yards.id, memberships.yardId)),
    );
}

type Row = Awaited<ReturnType<typeof selectMembers>>[number];

function memberOf({ deactivatedAt, roles, ...row }: Row): Member {
  return { ...row, roles: roles as Role[], active: deactivatedAt === null };
}

/** Everybody who works or worked here, by name, and the invitations still open. */
export async function listPeople(db: Db, actor: Actor, now: Date): Promise<PeopleList> {
  const { carrierId } = actor;
  const rows = await selectMembers(db)
    .where(eq(memberships.carrierId, carrierId))
    .orderBy(asc(people.name));
  const open = await db
    .select({
      id: invitations.id,
      name: invitations.name,
      email: invitations.email,
      roles: invitations.roles,
      expiresAt: invitations.expiresAt,
    })
    .from(invitations)
    .where(
      and(
        eq(invitations.carrierId, carrierId),
        isNull(invitations.acceptedAt),
        isNull(invitations.revokedAt),
        gt(invitations.expiresAt, now),
      ),
    )
    .orderBy(asc(invitations.name));
  return {
    members: rows.map(memberOf),
    invitations: open.map((row) => ({ ...row, roles: row.roles as Role[] })),
  };
}

/** One person of this carrier. */
export async function readMember(db: Db, actor: Actor, personId: string): Promise<Result<Member>> {
  const [row] = await selectMembers(db).where(thatMember(actor.carrierId, personId));
  return row ? ok(memberOf(row)) : refuse("not-found");
}
