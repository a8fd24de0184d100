/** Who is signed in, as routes and the sync server see them. */
export type SignedIn = {
	id: string;
	email: string;
	name: string;
	isAdministrator: boolean;
};
