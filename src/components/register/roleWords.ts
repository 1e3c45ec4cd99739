import type { Role } from '#contract';

/** The four parts, as people call them. */
export const roleWords: Readonly<Record<Role, string>> = {
  engineer: 'Engineer, prepares',
  checker: 'Checker, checks',
  lead: 'Lead, locks',
  reader: 'Reader, reads',
};
