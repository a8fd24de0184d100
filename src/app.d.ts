import type { Problem } from '$lib/server/problems';
import type { SignedIn } from '$lib/server/auth/sessions';

declare global {
	namespace App {
		interface Error {
			message: string;
			/** Status of a failure that has words for the person; else the page's own holds. */
			status?: number;
			/** Reference under which an unexpected failure was logged. */
			reference?: string;
		}
		interface Locals {
			/** Who is signed in; null on public pages. */
			person: SignedIn | null;
			sessionId: string | null;
			/** The failure, with words for the person, that ended this request. */
			problem?: Problem;
		}
	}
}

export {};
