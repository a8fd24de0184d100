/** Everybody in the demo programme is invented. */
import type { Role } from '../../src/lib/server/auth/permissions';

export const DEMO_PASSWORD = 'slow rope, tall sky';

export type DemoPerson = {
	key: string;
	name: string;
	/** Role and field in each programme, by its code. */
	roles: Partial<Record<'CL' | 'ML', { role: Role; field: string }>>;
	administrator?: boolean;
};

export const PEOPLE: DemoPerson[] = [
	{
		key: 'solvang',
		name: 'I. Solvang',
		roles: { CL: { role: 'lead', field: 'system' }, ML: { role: 'lead', field: 'system' } }
	},
	{
		key: 'nwosu',
		name: 'A. Nwosu',
		roles: { CL: { role: 'engineer', field: 'structures' } }
	},
	{
		key: 'quispe',
		name: 'M. Quispe',
		roles: {
			CL: { role: 'engineer', field: 'structures' },
			ML: { role: 'engineer', field: 'structures' }
		}
	},
	{
		key: 'abara',
		name: 'N. Abara',
		roles: {
			CL: { role: 'engineer', field: 'dynamics' },
			ML: { role: 'engineer', field: 'dynamics' }
		}
	},
	{
		key: 'lindqvist',
		name: 'S. Lindqvist',
		roles: {
			CL: { role: 'engineer', field: 'materials' },
			ML: { role: 'engineer', field: 'materials' }
		}
	},
	{
		key: 'haddad',
		name: 'L. Haddad',
		roles: {
			CL: { role: 'reviewer', field: 'structures' },
			ML: { role: 'reviewer', field: 'structures' }
		}
	},
	{ key: 'cordeiro', name: 'E. Cordeiro', roles: { CL: { role: 'reviewer', field: 'safety' } } },
	{
		key: 'laine',
		name: 'P. Laine',
		roles: {
			CL: { role: 'observer', field: 'customer' },
			ML: { role: 'observer', field: 'customer' }
		}
	},
	{ key: 'brandt', name: 'K. Brandt', roles: {}, administrator: true }
];

export const address = (key: string) => `${key}@halden.example`;
