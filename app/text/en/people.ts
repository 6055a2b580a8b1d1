import type { Role } from "../../domain/actor";
import { roleList } from "./roles";

// In one zone on the server and in the browser, so that both render the same day.
const day = new Intl.DateTimeFormat("en-US", {
  month: "short",
  day: "numeric",
  year: "numeric",
  timeZone: "UTC",
});

/** Words of the office's pages about people. */
export const peopleText = {
  title: "People",
  lead: "Who works here, what each may do, and whom to call.",
  invite: "Invite a person",
  none: "Nobody but you yet. Invite the drivers first.",
  working: "Working here",
  invited: "Invited, not joined yet",
  gone: (count: number) => `Deactivated (${count})`,
  you: "you",
  certifier: "Certifier",
  allYards: "All yards",
  noPhone: "No number yet",
  onCallAt: (place: number) => `On call: ${ordinal(place)}`,
  onCallTitle: "On call",
  onCallNone: "Nobody is on call. A held truck at five in the morning has nobody to ring.",
  onCallLead: "Called in this order when a truck is held.",
  expires: (at: Date) => `The link works until ${day.format(at)}.`,
  takeBack: "Take back",
  takeBackOf: (name: string) => `Take back the invitation of ${name}`,

  inviteTitle: "Invite a person",
  inviteLead: "They get a link by e-mail. It works for seven days, once.",
  name: "Name",
  nameHint: "As it should stand under a signature.",
  email: "E-mail address",
  emailHint: "Sign-in codes go here too.",
  roles: "Roles",
  rolesHint: "More than one if they do more than one job.",
  roleHint: {
    driver: "Walks trucks and takes keys.",
    mechanic: "Works at the bench.",
    dispatcher: "Hands keys over. Never signs a tag off.",
    manager: "Sets up trucks, people and policy.",
  } satisfies Record<Role, string>,
  certifierLabel: "May certify",
  certifierHint: "Signs tags off and lets trucks run under a limit.",
  yard: "Yard",
  yardHint:
    "Mail about red tags there goes to them. Leave it at all yards if they work everywhere.",
  onCall: "On call",
  onCallHint: "The place in the line of those who are called. The others close up.",
  onCallNever: "Not on call",
  onCallOption: ordinalLabel,
  send: "Send the invitation",

  save: "Save",
  phone: (number: string | null) => number ?? "No number yet. They add it under their own account.",
  sessions: "Signed-in devices",
  sessionsWhat: "A lost or stolen phone: end every session at once. What was recorded stays.",
  endSessions: "Sign out everywhere",
  deactivate: "Deactivate",
  deactivateTitle: (name: string) => `Deactivate ${name}`,
  deactivateWhat: (name: string) =>
    `${name} is signed out at once and cannot sign in here again. Walks, tags and signatures stay. You can reactivate them at any time.`,
  reactivate: "Reactivate",
  gonePerson: (name: string, roles: readonly Role[]) =>
    `${name} was deactivated. Reactivated, they work here again as ${roleList(roles)}.`,
} as const;

/** Words of a person's own account. */
export const accountText = {
  metaTitle: "Your account · Keypeg",
  title: "Your account",
  as: (roles: string, carrier: string) => `${roles} at ${carrier}`,
  toWork: "Go to work",
  email: "Your address",
  emailHint: "To change it, ask your manager to invite the new one.",
  phone: "Your phone number",
  phoneHint: "Shown to the people you work with, and where a held truck says whom to call.",
  savePhone: "Save the number",
  phoneSaved: "The number is saved.",
  devices: "Where you are signed in",
  thisDevice: "This device",
  unknownDevice: "A browser we do not know",
  since: (at: Date) => `Signed in ${day.format(at)}`,
  lastUsed: (at: Date) => `last used ${day.format(at)}`,
  end: "End",
  endOf: (device: string, at: Date) => `End the session on ${device}, signed in ${day.format(at)}`,
  endOthers: "End all others",
  ended: "That session has ended.",
  endedOthers: "All other sessions have ended.",
  carriers: "Your firms",
  carriersWhat: "You work for more than one. Choose whose trucks you see.",
  here: "You are here",
  switchTo: (carrier: string) => `Switch to ${carrier}`,
  signOut: "Sign out",
} as const;

function ordinalLabel(place: number): string {
  return `${ordinal(place)} to be called`;
}

function ordinal(place: number): string {
  const rule = new Intl.PluralRules("en-US", { type: "ordinal" }).select(place);
  const ending = { one: "st", two: "nd", few: "rd" }[rule as "one" | "two" | "few"] ?? "th";
  return `${place}${ending}`;
}
