/**
 * What stands around the note's text and is fetched beside it: people, remarks, what moved checks, the
 * last baseline and what changed since. Fetched anew when the server says that it changed.
 */
import { createQuery, QueryClient } from '@tanstack/svelte-query';
import type { ItemChange } from '$lib/note/compare';
import type { Item } from '$lib/note/items';
import { newerThan, readTaken, type Takeable } from '$lib/note/taken';
import type { Side } from '$lib/note/readings';
import type { Baseline } from '$lib/server/baselines/read';
import type { CheckMovement } from '$lib/server/notes/written';
import type { Role } from '$lib/server/auth/permissions';
import type { RemarkView } from '$lib/server/remarks/list';
import type { NoteSession } from '$lib/sync/note-session.svelte';
import type { PersonHere } from '$lib/sync/presence';
import { fetchJson } from '$lib/fetch-json';
import { groupBy } from './group';
import type { NoteSheet } from './sheet.svelte';
import type { Was } from './sheet-view';

type Given = {
	noteId: string;
	me: { id: string; name: string };
	/** A role may change while the note is open. */
	role: () => Role;
	session: NoteSession;
	sheet: NoteSheet;
};

/** Pause after the last result before changes since the baseline are told anew, in milliseconds. */
const SETTLED = 250;

export class NoteSurroundings {
	readonly noteId: string;
	readonly me: Given['me'];
	changes = $state.raw<ReadonlyMap<string, ItemChange> | null>(null);

	#role: () => Role;
	#session: NoteSession;
	#sheet: NoteSheet;
	#client = new QueryClient({ defaultOptions: { queries: { staleTime: Infinity, retry: 2 } } });
	#remarks;
	#movements;
	#baseline;
	#parameters;
	/** Whether somebody looks for a parameter to take. */
	#asked = $state(false);

	/** Called while a component is being set up: its queries live as long as the component. */
	constructor({ noteId, me, role, session, sheet }: Given) {
		this.noteId = noteId;
		this.me = me;
		this.#role = role;
		this.#session = session;
		this.#sheet = sheet;
		const query = <T>(
			kind: string,
			path: string,
			more: { wanted?: () => boolean; every?: number } = {}
		) =>
			createQuery(
				() => ({
					queryKey: [kind],
					queryFn: () => fetchJson<T>(`/api/notes/${noteId}/${path}`),
					// What is beside the text comes after the text.
					enabled: sheet.evaluated && (more.wanted?.() ?? true),
					...(more.every && { refetchInterval: more.every })
				}),
				() => this.#client
			);
		this.#remarks = query<RemarkView[]>('remarks', 'remarks');
		this.#movements = query<CheckMovement[]>('movements', 'movements');
		this.#baseline = query<Baseline | null>('baselines', 'baselines/latest');
		// Other notes tell this one nothing: their baselines are looked for now and then.
		this.#parameters = query<Takeable[]>('parameters', 'parameters', {
			wanted: () => this.#asked || sheet.takes,
			every: 60_000
		});

		$effect(() =>
			session.on('event', ({ kind }) => {
				void this.#client.invalidateQueries({ queryKey: [kind] });
				// Who removed an item with pins is written down with what its going moved.
				if (kind === 'movements') this.refetchRemarks();
			})
		);
		$effect(() => this.#tellChanges(sheet));
	}

	get role(): Role {
		return this.#role();
	}

	get baseline(): Baseline | null {
		return this.#baseline.data ?? null;
	}

	get remarks(): RemarkView[] {
		return this.#remarks.data ?? [];
	}

	/** What other notes of the programme have frozen; undefined before it is fetched. */
	get parameters(): Takeable[] | undefined {
		return this.#parameters.data;
	}

	get parametersFailed(): boolean {
		return this.#parameters.isError;
	}

	/** Fetches them, also where no given of the note is taken from a baseline yet. */
	askParameters(): void {
		this.#asked = true;
	}

	/** The same quantity in a newer baseline than the given was taken from, where it says otherwise now. */
	newerOf(item: Item): Takeable | null {
		const taken = item.kind === 'given' ? readTaken(item.taken) : null;
		const result = this.#sheet.result(item.id);
		if (!taken || result?.kind !== 'given') return null;
		return newerThan(taken, result.outcome, this.parameters ?? []);
	}

	readonly #remarksByItem = $derived.by(() => groupBy(this.remarks, ({ itemId }) => itemId));
	readonly #peopleByItem = $derived.by(() =>
		groupBy(this.#session.people, ({ itemId }) => itemId ?? '')
	);
	readonly #movementByItem = $derived.by(() =>
		groupBy(this.#movements.data ?? [], ({ itemId }) => itemId)
	);

	remarksOn(id: string): RemarkView[] {
		return this.#remarksByItem.get(id) ?? [];
	}

	peopleAt(id: string): PersonHere[] {
		return this.#peopleByItem.get(id) ?? [];
	}

	someoneRemarks(id: string): boolean {
		return this.peopleAt(id).some(({ activity }) => activity === 'remarks');
	}

	/** What brought a check to the state that it is in; what brought it to an earlier one is over. */
	movementOf(id: string): CheckMovement | undefined {
		const movement = this.#movementByItem.get(id)?.[0];
		const result = this.#sheet.result(id);
		return result?.kind === 'check' && movement?.state === result.state ? movement : undefined;
	}

	wasOf(id: string): Was | null {
		const change = this.changes?.get(id);
		if (!change || !this.baseline) return null;
		const { words, outputs, text } = change;
		return { letter: this.baseline.revision, words, outputs, text };
	}

	refetchRemarks(): void {
		void this.#client.invalidateQueries({ queryKey: ['remarks'] });
	}

	#tellChanges(sheet: NoteSheet) {
		const { baseline } = this;
		if (!baseline) return;
		// Read whole so that any edit or result sets the pause anew.
		const now: Side = { content: sheet.content(), results: sheet.results() };
		const timer = setTimeout(async () => {
			const { changesSince } = await import('$lib/note/compare');
			this.changes = changesSince(baseline.revision, baseline, now).items;
		}, SETTLED);
		return () => clearTimeout(timer);
	}
}
