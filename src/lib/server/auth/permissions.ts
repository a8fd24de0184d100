/**
 * Who may do what: the one table, asked by routes, the API and the sync server alike.
 *
 * A role is held per programme. The site's administrator keeps accounts and programmes and has, by
 * that alone, no say in a design and no sight of one.
 */
export const ROLES = ['lead', 'engineer', 'reviewer', 'observer'] as const;
export type Role = (typeof ROLES)[number];

const everyone: readonly Role[] = ROLES;
const writers: readonly Role[] = ['lead', 'engineer'];
const reviewing: readonly Role[] = ['lead', 'engineer', 'reviewer'];
const leads: readonly Role[] = ['lead'];

/** Actions inside a programme, with the roles that may take them. */
const PROGRAMME = {
	'programme.read': everyone,
	'programme.change': leads,
	'people.read': everyone,
	'people.invite': leads,
	'people.change': leads,
	'gate.change': leads,
	'note.read': everyone,
	'note.create': writers,
	'note.edit': writers,
	'presence.share': everyone,
	'remark.read': everyone,
	'remark.write': reviewing,
	'remark.settle': reviewing,
	'evidence.read': everyone,
	'evidence.upload': writers,
	'baseline.read': everyone,
	'baseline.verify': everyone,
	'baseline.freeze': leads
} as const satisfies Record<string, readonly Role[]>;

/** Actions on the site as a whole, for its administrator. */
const SITE = ['programme.create', 'accounts.read', 'accounts.invite'] as const;

/** Actions of a program that asks the API with a token, with the scopes that include them. */
const API = {
	'methods.read': ['read', 'evaluate'],
	'methods.run': ['evaluate'],
	'note.evaluate': ['evaluate']
} as const satisfies Record<string, readonly TokenScope[]>;

export type TokenScope = 'read' | 'evaluate';
export type ApiAction = keyof typeof API;
export const API_ACTIONS = Object.keys(API) as ApiAction[];

export type ProgrammeAction = keyof typeof PROGRAMME;
export type SiteAction = (typeof SITE)[number];

export const PROGRAMME_ACTIONS = Object.keys(PROGRAMME) as ProgrammeAction[];
export const SITE_ACTIONS: readonly SiteAction[] = SITE;

/** Whether somebody with `role` in the programme (null: no member) may take the action. */
export function may(role: Role | null, action: ProgrammeAction): boolean {
	return role !== null && (PROGRAMME[action] as readonly Role[]).includes(role);
}

export function mayWithToken(scope: TokenScope, action: ApiAction): boolean {
	return (API[action] as readonly TokenScope[]).includes(scope);
}

export function mayOnSite(person: { isAdministrator: boolean }, _action: SiteAction): boolean {
	return person.isAdministrator;
}
