export const ROLES = ["driver", "mechanic", "dispatcher", "manager"] as const;
export type Role = (typeof ROLES)[number];

/** Who acts, in which carrier. Every query is scoped to `carrierId` (K7). */
export interface Actor {
  carrierId: string;
  personId: string;
  name: string;
  roles: readonly Role[];
  /** A mechanic, or a person named by the carrier, who may sign tags off. */
  certifier: boolean;
  yardId: string | null;
}
