import type { SignedIn } from '$lib/server/auth/sessions';

declare global {
	namespace App {
		interface Error {
			message: string;
			/** Reference under which an unexpected failure was logged. */
			reference?: string;
		}
		interface Locals {
			/** Who is signed in; null on public pages. */
			person: SignedIn | null;
			sessionId: string | null;
		}
	}
}

export {};
