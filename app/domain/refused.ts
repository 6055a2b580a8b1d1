import type { Refusal } from "./refusals";

/** Carries a refusal out of a transaction, which it rolls back. Never leaves the domain. */
export class Refused extends Error {
  constructor(readonly refusal: Refusal) {
    super(refusal.code);
    this.name = "Refused";
  }
}
