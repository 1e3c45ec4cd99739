/** The parts people play in a project. */
export const roles = ['engineer', 'checker', 'lead', 'reader'] as const;
export type Role = (typeof roles)[number];

/** The life of a revision. */
export const revisionStates = ['draft', 'for check', 'checked', 'locked', 'superseded', 'withdrawn'] as const;
export type RevisionState = (typeof revisionStates)[number];

/** What can be done to a revision. */
export const acts = [
  'revision.read',
  'content.write',
  'remark.ask',
  'remark.answer',
  'remark.close',
  'tick.set',
  'revision.handOver',
  'revision.return',
  'revision.check',
  'revision.lock',
  'revision.begin',
] as const;
export type Act = (typeof acts)[number];

interface AccessRow {
  roles: readonly Role[];
  states: readonly RevisionState[];
}

const open = ['draft', 'for check'] as const;
const unlocked = ['draft', 'for check', 'checked'] as const;

/**
 * The one place that says who may do what, and when. Routes, the sync endpoint, Socket.IO and the
 * screens all ask `may`. Conditions on content (ticks, remarks, signatures) are rules of services.
 */
export const accessTable: Readonly<Record<Act, AccessRow>> = {
  'revision.read': { roles, states: revisionStates },
  'content.write': { roles: ['engineer'], states: open },
  'remark.ask': { roles: ['checker', 'lead'], states: unlocked },
  'remark.answer': { roles: ['engineer', 'checker', 'lead'], states: unlocked },
  'remark.close': { roles: ['checker', 'lead'], states: unlocked },
  'tick.set': { roles: ['checker'], states: open },
  // While it is checked, a correction voids the signature; handing over again signs anew.
  'revision.handOver': { roles: ['engineer'], states: open },
  'revision.return': { roles: ['checker', 'lead'], states: ['for check', 'checked'] },
  'revision.check': { roles: ['checker'], states: ['for check'] },
  'revision.lock': { roles: ['lead'], states: ['checked'] },
  'revision.begin': { roles: ['engineer', 'lead'], states: ['locked'] },
};

/** Whether a member in `role` may do `act` to a revision in `state`; no role means no access. */
export function may(role: Role | undefined, act: Act, state: RevisionState): boolean {
  if (role === undefined) return false;
  const row = accessTable[act];
  return row.roles.includes(role) && row.states.includes(state);
}

/** What can be done to a project and to the house as a whole. */
export const projectActs = ['project.read', 'project.manage', 'calculation.create', 'calculation.rename'] as const;
export type ProjectAct = (typeof projectActs)[number];

const projectAccess: Readonly<Record<ProjectAct, readonly Role[]>> = {
  'project.read': roles,
  'project.manage': [],
  'calculation.create': ['engineer', 'lead'],
  'calculation.rename': ['engineer', 'lead'],
};

/** Administrators keep people and projects; they see no content unless they are members. */
export function mayInProject(role: Role | undefined, act: ProjectAct, administrator = false): boolean {
  if (administrator && (act === 'project.manage' || act === 'project.read')) return true;
  return role !== undefined && projectAccess[act].includes(role);
}
