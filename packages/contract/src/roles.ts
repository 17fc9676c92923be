/** Who may hold a key. Programs: pipeline, lims; people behind a program: the others. */
export const roles = ['pipeline', 'analyst', 'lims', 'method-owner', 'admin', 'auditor'] as const;

/** A role of an access key. */
export type Role = (typeof roles)[number];

/** True when the text names a role. */
export function isRole(text: string): text is Role {
  return (roles as readonly string[]).includes(text);
}
