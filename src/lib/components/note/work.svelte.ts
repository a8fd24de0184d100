/**
 * What one person does on a live note: which row is current, which is open, what is added, moved,
 * copied, removed and put back. Every edit goes into the document under the session's origin.
 */
import { tick } from 'svelte';
import { copyItems, duplicateItem, pasteItems } from '$lib/note/clipboard';
import { addItem, completeFields, moveItem, removeItem, writeFields } from '$lib/note/document';
import { fieldsOf, takenText, type Takeable } from '$lib/note/taken';
import { KIND_NAMES, type Item, type ItemKind } from '$lib/note/items';
import type { NoteSession } from '$lib/sync/note-session.svelte';
import { AsItWas } from './as-it-was';
import { itemTitle } from './kinds';
import type { NoteSheet } from './sheet.svelte';

/** What the person may do here, by role. */
export type Can = { edit: boolean; remark: boolean; freeze: boolean };

/** An item that this person took away, with its place, to be put back. */
export type Removed = { item: Item; number: string; after: string | null };

const COPIED = 'holdfast copied items';

export class NoteWork {
	/** The row that the arrow keys move from. */
	current = $state<string | null>(null);
	/** The row open for editing. */
	open = $state<string | null>(null);
	/** The row whose thread of remarks is open. */
	thread = $state<string | null>(null);
	/** The line model whose charts are open across the sheet. */
	charts = $state<string | null>(null);
	/** Below which item the add bar is open; null is the top of the sheet, undefined closed. */
	adding = $state<string | null | undefined>(undefined);
	removed = $state.raw<Removed | null>(null);
	/** The last act in words, for the live region. */
	said = $state('');
	/** Editing is for wider screens. */
	wide = $state(true);
	/** How many rows are mounted: a screen of them, the rest follow while the browser is idle. */
	mounted = $state(16);

	#was: AsItWas | null = null;

	constructor(
		readonly session: NoteSession,
		readonly sheet: NoteSheet,
		/** A role may change while the note is open. */
		private readonly granted: () => Can
	) {}

	get can(): Can {
		return this.granted();
	}

	get mayEdit(): boolean {
		return this.can.edit && this.wide && !['refused', 'closed'].includes(this.session.status);
	}

	get asItWas(): AsItWas | null {
		return this.#was;
	}

	/** Brings a row into view and puts the focus on it. */
	async go(id: string): Promise<void> {
		const index = this.sheet.order.indexOf(id);
		if (index < 0) return;
		this.mounted = Math.max(this.mounted, index + 20);
		this.current = id;
		await tick();
		const row = document.getElementById(id);
		row?.scrollIntoView({ block: 'center' });
		row?.focus({ preventScroll: true });
	}

	step(from: string, by: 1 | -1): void {
		const index = this.sheet.order.indexOf(from);
		const next = this.sheet.order[Math.max(0, index + by)];
		if (next !== undefined) void this.focus(next);
	}

	/** As `go`, but scrolls only as far as needed. */
	async focus(id: string): Promise<void> {
		this.mounted = Math.max(this.mounted, this.sheet.order.indexOf(id) + 2);
		this.current = id;
		await tick();
		const row = document.getElementById(id);
		row?.focus({ preventScroll: true });
		row?.scrollIntoView({ block: 'nearest' });
	}

	here(activity: 'reads' | 'types' | 'remarks'): void {
		this.session.here(this.current, activity);
	}

	edit(id: string): void {
		if (!this.mayEdit || this.open === id || !this.sheet.item(id)) return;
		this.#was?.forget();
		completeFields(this.session.doc, id);
		this.#was = new AsItWas(this.session.doc, id, this.session.origin);
		this.current = id;
		this.open = id;
		this.adding = undefined;
		this.here('types');
	}

	/** Closes the open row; what was typed is already in the document. */
	done(): void {
		const id = this.open;
		if (id === null) return;
		this.#was?.forget();
		this.#was = null;
		this.open = null;
		this.here('reads');
		if (this.sheet.item(id)) void this.focus(id);
	}

	/** Closes the open row with what it held when it was opened. */
	cancel(): void {
		this.#was?.restore();
		this.done();
	}

	add(kind: ItemKind, after: string | null): void {
		const { doc, origin } = this.session;
		const id = addItem(doc, { kind } as Parameters<typeof addItem>[1], { after, origin });
		this.adding = undefined;
		this.said = `${KIND_NAMES[kind]} added as ${this.sheet.number(id)}.`;
		this.mounted = Math.max(this.mounted, this.sheet.order.indexOf(id) + 2);
		this.edit(id);
	}

	/** Fills a given from a baseline of another note; symbol and words only where it has none. */
	take(id: string, from: Takeable): void {
		const item = this.sheet.item(id);
		const fields = fieldsOf(from);
		if (!this.mayEdit || item?.kind !== 'given' || !fields) return;
		const { doc, origin } = this.session;
		completeFields(doc, id);
		const named = {
			...(item.symbol.trim() === '' && !from.output && { symbol: from.symbol }),
			...(item.description.trim() === '' && { description: from.description })
		};
		writeFields(doc, id, { ...fields, ...named }, { taken: takenText(from) }, origin);
		this.said = `Taken from ${fields.source}.`;
	}

	move(id: string, after: string | null): void {
		moveItem(this.session.doc, id, { after, origin: this.session.origin });
		this.said = `Now ${this.sheet.number(id)}.`;
	}

	moveBy(id: string, by: 1 | -1): void {
		const { order } = this.sheet;
		const index = order.indexOf(id);
		const beyond = index + (by === 1 ? 1 : -2);
		if (index < 0 || index + by < 0 || index + by >= order.length) return;
		this.move(id, order[beyond] ?? null);
		if (this.open === null) void this.focus(id);
	}

	duplicate(id: string): void {
		const copy = duplicateItem(this.session.doc, id, this.session.origin);
		if (copy === null) return;
		this.said = `Copied as ${this.sheet.number(copy)}.`;
		void this.focus(copy);
	}

	remove(id: string): void {
		const item = this.sheet.item(id);
		if (!item || !this.mayEdit) return;
		const index = this.sheet.order.indexOf(id);
		const after = this.sheet.order[index - 1] ?? null;
		const next = this.sheet.order[index + 1] ?? after;
		this.removed = { item, number: this.sheet.number(id), after };
		if (this.open === id) this.done();
		removeItem(this.session.doc, id, this.session.origin);
		this.said = `${this.removed.number} ${itemTitle(item)} is removed.`;
		if (next !== null) void this.focus(next);
	}

	putBack({ item, after }: Removed): void {
		const { doc, origin } = this.session;
		const place =
			after !== null && this.sheet.item(after) ? after : (this.sheet.order.at(-1) ?? null);
		addItem(doc, item, { after: place, origin });
		if (this.removed?.item.id === item.id) this.removed = null;
		this.said = `${this.sheet.number(item.id)} is back.`;
		void this.focus(item.id);
	}

	/** What was just removed here and not yet put back. */
	get justRemoved(): Removed | null {
		return this.removed && !this.sheet.item(this.removed.item.id) ? this.removed : null;
	}

	undo(): void {
		this.session.undo();
		this.said = 'Taken back.';
	}

	redo(): void {
		this.session.redo();
		this.said = 'Done again.';
	}

	/** Copies an item so that it can be pasted here or into another note of the programme. */
	copy(id: string): string {
		const text = copyItems(this.session.doc, [id]);
		localStorage.setItem(COPIED, text);
		// Refused where the page is not in a secure context: pasting here then goes by what is kept.
		navigator.clipboard?.writeText(text).catch(() => {});
		this.said = `${this.sheet.number(id)} is copied.`;
		return text;
	}

	/** Pastes what `copy` kept, or the text of a clipboard. */
	paste(after: string | null, text = localStorage.getItem(COPIED) ?? ''): boolean {
		if (!this.mayEdit) return false;
		const ids = pasteItems(this.session.doc, text, { after, origin: this.session.origin });
		if (!ids?.[0]) return false;
		this.adding = undefined;
		this.said = `Pasted as ${this.sheet.number(ids[0])}.`;
		void this.focus(ids[0]);
		return true;
	}

	get hasCopied(): boolean {
		return localStorage.getItem(COPIED) !== null;
	}
}
