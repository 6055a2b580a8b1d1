import { expect, test } from "vitest";
import type { Actor, Role } from "~/domain/actor";
import { type SignableTag, whySignerMayNot } from "~/domain/tags/who-signs";

const person = (roles: Role[], certifier: boolean): Actor => ({
  carrierId: "c",
  personId: "me",
  name: "Me",
  roles,
  certifier,
  yardId: null,
});
const tag = (more: Partial<SignableTag> = {}): SignableTag => ({
  kind: "defect",
  colour: "red",
  raisedBy: "other",
  fromWalk: true,
  roadSafety: false,
  driverFix: false,
  remote: false,
  disputedSigner: null,
  ...more,
});
const off = { driverFix: false, twoPeople: false };
const list = { driverFix: true, twoPeople: false };

test("K10: a driver never signs off a red tag of their own from a walk, whatever else they are", () => {
  const own = tag({ raisedBy: "me" });
  for (const roles of [["driver"], ["driver", "mechanic"], ["driver", "manager"]] as Role[][]) {
    for (const certifier of [true, false]) {
      expect(whySignerMayNot(person(roles, certifier), own, off, false)).toBe("own-red-tag");
      expect(whySignerMayNot(person(roles, certifier), own, list, false)).toBe("own-red-tag");
    }
  }
});

test("K10: from the driver-fix list, where the carrier allows it, they do", () => {
  const bulb = tag({ raisedBy: "me", driverFix: true });
  expect(whySignerMayNot(person(["driver"], false), bulb, list, false)).toBeNull();
  expect(whySignerMayNot(person(["driver"], false), bulb, off, false)).toBe("own-red-tag");
  expect(whySignerMayNot(person(["driver"], false), bulb, list, true)).toBe("own-red-tag");
});

test("K10: a person of the office alone ends nothing", () => {
  for (const certifier of [true, false]) {
    expect(whySignerMayNot(person(["dispatcher"], certifier), tag(), off, false)).toBe(
      "not-allowed",
    );
  }
});

test("K10: remote only where the check allows, never on road-safety parts", () => {
  const mechanic = person(["mechanic"], true);
  expect(whySignerMayNot(mechanic, tag(), off, true)).toBe("not-from-photos");
  expect(whySignerMayNot(mechanic, tag({ remote: true }), off, true)).toBeNull();
  expect(whySignerMayNot(mechanic, tag({ remote: true, roadSafety: true }), off, true)).toBe(
    "not-from-photos",
  );
});

test("a driver's refusal of a sign-off needs another certifier than the first", () => {
  const mechanic = person(["mechanic"], true);
  const dispute = tag({ kind: "not-satisfied", disputedSigner: "me" });
  expect(whySignerMayNot(mechanic, dispute, off, false)).toBe("second-certifier");
  expect(whySignerMayNot(mechanic, { ...dispute, disputedSigner: "other" }, off, false)).toBeNull();
});
