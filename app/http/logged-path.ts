/** A path as a log may keep it: the token of an invitation opens a door, so it is left out. */
export function loggedPath(path: string): string {
  return path.replace(/^\/invitation\/[^/.]+/, "/invitation/…");
}
