/** What each role may do, in words for the person; the table itself is the server's. */
export const ROLE_OPTIONS = [
	{ value: 'engineer', label: 'engineer', says: 'writes notes, answers remarks' },
	{ value: 'reviewer', label: 'reviewer', says: 'reads, pins and settles remarks; cannot edit' },
	{ value: 'observer', label: 'observer', says: 'reads; nothing else' },
	{ value: 'lead', label: 'lead', says: 'also invites, sets gates and freezes' }
] as const;

type RoleName = (typeof ROLE_OPTIONS)[number]['value'];

const READ = 'read every note and baseline of the programme';
const REMARK = 'pin remarks to a number, answer and settle them';
const WRITE = 'create and edit notes';
const LEAD = 'invite people, set roles and gates, freeze baselines';

export const ROLE_MAY: Record<RoleName, { may: string[]; mayNot: string[] }> = {
	lead: { may: [READ, REMARK, WRITE, LEAD], mayNot: ['change a baseline that is frozen'] },
	engineer: { may: [READ, REMARK, WRITE], mayNot: ['invite people', 'freeze a baseline'] },
	reviewer: { may: [READ, REMARK], mayNot: ['edit a note', 'freeze a baseline'] },
	observer: { may: [READ], mayNot: ['pin remarks', 'edit a note', 'freeze a baseline'] }
};
