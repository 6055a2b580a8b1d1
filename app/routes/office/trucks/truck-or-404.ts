import type { Db } from "~/db/client";
import type { Actor } from "~/domain/actor";
import { type TruckSetup, truckSetup } from "~/domain/trucks/truck-setup";
import { notFound } from "../office-reply";

/** The truck a unit number in the path names, or a 404. */
export async function truckOr404(db: Db, actor: Actor, unitNumber: string): Promise<TruckSetup> {
  return (await truckSetup(db, actor, unitNumber)) ?? notFound("truck");
}
