/** The roles of the register, as stored. */
export const ROLES = ['reader', 'technician', 'engineer', 'planner', 'administrator'] as const;

/** A role, as stored. */
export type Role = (typeof ROLES)[number];

const EVERYONE = ROLES;
const AT_THE_MACHINE = ['technician', 'engineer', 'administrator'] as const;
const BY_JUDGEMENT = ['engineer', 'administrator'] as const;

/**
 * Who may do what. One table for the server's check and for what a screen offers; a permission is a
 * literal, so that a misspelt one does not compile.
 */
export const PERMISSIONS = {
  'register:read': EVERYONE,
  'register:edit': BY_JUDGEMENT,
  'measurement:read': EVERYONE,
  'measurement:upload': AT_THE_MACHINE,
  'measurement:decide': AT_THE_MACHINE,
  'event:record': ['technician', 'engineer', 'planner', 'administrator'],
  'balanceJob:read': EVERYONE,
  'balanceJob:open': ['technician', 'engineer', 'planner', 'administrator'],
  'balanceJob:record': AT_THE_MACHINE,
  'balanceJob:override': BY_JUDGEMENT,
  'balanceJob:sign': AT_THE_MACHINE,
  /** A further signature under a signed record: the engineer, or the owner of the area. */
  'balanceJob:cosign': ['technician', 'engineer', 'planner', 'administrator'],
  'balanceJob:addendum': AT_THE_MACHINE,
  'dueBoard:read': EVERYONE,
  'workbench:use': EVERYONE,
  'limitSet:read': EVERYONE,
  'limitSet:edit': BY_JUDGEMENT,
  'person:read': ['administrator'],
  'person:edit': ['administrator'],
  'site:edit': ['administrator'],
  'session:end': EVERYONE,
  'password:change': EVERYONE,
} as const satisfies Record<string, readonly Role[]>;

/** A thing somebody may be allowed to do. */
export type Permission = keyof typeof PERMISSIONS;

/** Whether a role holds a permission. Example: `allows('reader', 'register:edit')` is false. */
export function allows(role: Role, permission: Permission): boolean {
  const roles: readonly Role[] = PERMISSIONS[permission];
  return roles.includes(role);
}
