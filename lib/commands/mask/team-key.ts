/** Keeps the team's keys apart from every mask that Neap will ever ship. */
export const TEAM_KEY_PREFIX = "team-";

/** Key of a team's mask: its title in lower case, with hyphens, as far as letters and digits go. */
export function teamKey(title: string): string {
  const plain = title
    .normalize("NFKD")
    .replace(/\p{M}/gu, "")
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, "-")
    .slice(0, 60)
    .replace(/^-+|-+$/g, "");
  return `${TEAM_KEY_PREFIX}${plain || "mask"}`;
}
