/**
 * Roles and what they may do: one table, which the server decides by and the client hides by.
 * This file holds values without schemas, so that the client can import it without the schema library.
 */
export const roles = ['engineer', 'electrician', 'commissioning', 'technician', 'administrator', 'viewer'] as const;
export type Role = (typeof roles)[number];

export const permissions = ['session', 'project:read', 'project:create', 'design:write', 'catalogue:read', 'catalogue:write'] as const;
export type Permission = (typeof permissions)[number];

const reads: readonly Permission[] = ['session', 'project:read', 'catalogue:read'];

export const permissionsOf: Readonly<Record<Role, readonly Permission[]>> = {
  engineer: [...reads, 'project:create', 'design:write', 'catalogue:write'],
  electrician: reads,
  commissioning: reads,
  technician: reads,
  administrator: [...reads, 'project:create', 'catalogue:write'],
  viewer: reads,
};

export const rolesAllow = (held: readonly Role[], permission: Permission): boolean =>
  held.some((role) => permissionsOf[role].includes(permission));
