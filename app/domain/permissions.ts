export const roles = ["owner", "performer", "tech", "guest"] as const;
export type Role = (typeof roles)[number];

/**
 * What a member may do, by role. One table for server guards and for buttons.
 *
 * - `view`: gigs, songs, guitars and sheets
 * - `plan`: songs, gigs, order and rules
 * - `prepare`: guitars, strings and capos; guitar and tuning for a song in a set; tech notes
 * - `manage`: act settings, people, roles, deleting the act
 */
const table = {
  view: ["owner", "performer", "tech", "guest"],
  plan: ["owner", "performer"],
  prepare: ["owner", "performer", "tech"],
  manage: ["owner"],
} as const satisfies Record<string, readonly Role[]>;

export type Action = keyof typeof table;
export const actions = Object.keys(table) as Action[];

/**
 * Whether a role may do an action.
 * @example can("tech", "prepare") // true
 * @example can("tech", "plan") // false
 */
export function can(role: Role, action: Action): boolean {
  return (table[action] as readonly Role[]).includes(role);
}
