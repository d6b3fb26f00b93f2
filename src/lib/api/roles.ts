/** What somebody is in a yard. */
export const ROLES = ['manager', 'painter', 'owner'] as const;
export type Role = (typeof ROLES)[number];
