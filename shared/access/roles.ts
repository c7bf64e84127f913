import { z } from 'zod';

/** Each role can do all that the one before it can. */
export const roles = ['reader', 'technician', 'editor', 'archivist', 'administrator'] as const;
export const role = z.enum(roles);
export type Role = z.infer<typeof role>;

/** Who may do what: the lowest role for each action. The role x endpoint test walks this table. */
export const lowestRole = {
  'read-manuals': 'reader',
  search: 'reader',
  evaluate: 'reader',
  'save-settings': 'technician',
  comment: 'technician',
  'edit-pages': 'editor',
  'edit-quantities': 'editor',
  'publish-editions': 'editor',
  'add-manuals': 'archivist',
  'upload-sources': 'archivist',
  'run-recognition': 'archivist',
  'manage-people': 'administrator',
  'see-audit': 'administrator',
  'see-outbox': 'administrator',
} as const satisfies Record<string, Role>;

export type Action = keyof typeof lowestRole;

export const can = (who: Role, action: Action): boolean => roles.indexOf(who) >= roles.indexOf(lowestRole[action]);
