/** The live side of the site: takes upgrades, keeps one room for each open note, hears other processes. */
import { randomUUID } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import type { Duplex } from 'node:stream';
import { WebSocketServer, type WebSocket } from 'ws';
import type { Announcement, Notice } from '$lib/server/events';
import { log } from '$lib/server/log';
import { may } from '$lib/server/auth/permissions';
import { CLOSE } from '$lib/sync/close-codes';
import { admit, isOwnPage, noteAskedFor, type Admitted } from './admission';
import { Connection, closeSocket } from './connection';
import { LIMITS, type Limits } from './limits';
import { Listener } from './listener';
import { Room } from './room';
import type { Evaluate } from './watcher';

/** Sessions end by themselves as well: every connection is asked about again this often (ms). */
const REVIEW = 60_000;

export class SyncServer {
	readonly #process = randomUUID();
	readonly #rooms = new Map<string, Room>();
	readonly #listener: Listener;
	readonly #sockets: WebSocketServer;
	readonly #limits: Limits;
	readonly #undecided = new Map<string, number>();
	readonly #ofPerson = new Map<string, number>();
	#review: NodeJS.Timeout | null = null;
	#ending = false;

	constructor(
		private readonly evaluate: Evaluate,
		limits: Partial<Limits> = {}
	) {
		this.#limits = { ...LIMITS, ...limits };
		// Not compressed: a small frame could unpack into any amount of memory.
		this.#sockets = new WebSocketServer({
			noServer: true,
			clientTracking: false,
			maxPayload: this.#limits.frame,
			perMessageDeflate: false
		});
		this.#listener = new Listener(
			(notice) => this.#heard(notice),
			() => this.#missed()
		);
	}

	/** Notes that are open in this process. */
	get openNotes(): string[] {
		return [...this.#rooms.keys()];
	}

	async start(): Promise<void> {
		await this.#listener.start();
		this.#review = setInterval(() => void this.#reviewAll(() => true), REVIEW);
	}

	/** Takes no more upgrades, asks clients to come back, commits what is left, and ends. */
	async stop(): Promise<void> {
		this.#ending = true;
		if (this.#review) clearInterval(this.#review);
		await Promise.all([...this.#rooms.values()].map((room) => room.end(CLOSE.RESTART)));
		await this.#listener.stop();
	}

	upgrade(request: IncomingMessage, socket: Duplex, head: Buffer): void {
		socket.on('error', () => socket.destroy());
		const noteId = noteAskedFor(request);
		if (noteId === null) return refuse(socket, 404, 'Not Found');
		if (this.#ending) return refuse(socket, 503, 'Service Unavailable');
		if (!isOwnPage(request)) return refuse(socket, 403, 'Forbidden');
		const address = request.socket.remoteAddress ?? '';
		if (!take(this.#undecided, address, this.#limits.undecidedPerAddress))
			return refuse(socket, 429, 'Too Many Requests');
		void admit(noteId, request.headers.cookie ?? null)
			.catch((error: unknown) => {
				log.warn({ error }, 'whether to open a note could not be decided');
				return CLOSE.UNAVAILABLE;
			})
			.then((admitted) => {
				give(this.#undecided, address);
				// Browsers do not show the status of a refused upgrade to the page, only a close code.
				this.#sockets.handleUpgrade(request, socket, head, (ws) => this.#opened(ws, admitted));
			});
	}

	#opened(ws: WebSocket, admitted: Admitted | number): void {
		ws.on('error', () => {});
		if (this.#ending) return closeSocket(ws, CLOSE.RESTART);
		if (typeof admitted === 'number') return closeSocket(ws, admitted);
		const { noteId, person } = admitted;
		if (!take(this.#ofPerson, person.id, this.#limits.socketsPerPerson))
			return closeSocket(ws, CLOSE.TOO_MANY);
		ws.once('close', () => give(this.#ofPerson, person.id));
		const room = this.#room(noteId);
		const connection = new Connection(ws, admitted, room, this.#limits);
		room.join(connection).catch((error: unknown) => {
			log.error({ error, noteId }, 'a note could not be loaded');
			connection.close(CLOSE.UNAVAILABLE);
		});
	}

	#room(noteId: string): Room {
		const open = this.#rooms.get(noteId);
		if (open) return open;
		const room: Room = new Room({
			noteId,
			process: this.#process,
			evaluate: this.evaluate,
			uncommitted: this.#limits.uncommitted,
			gone: () => {
				if (this.#rooms.get(noteId) === room) this.#rooms.delete(noteId);
			}
		});
		this.#rooms.set(noteId, room);
		return room;
	}

	#heard(notice: Notice): void {
		switch (notice.kind) {
			case 'updates':
			case 'presence':
			case 'who is there': {
				const room = this.#rooms.get(notice.noteId);
				if (room && notice.from !== this.#process) this.#heardElsewhere(room, notice);
				return;
			}
			case 'access':
				void this.#accessChanged(notice);
				return;
			default: {
				const { kind, noteId, programmeId } = notice;
				for (const [openId, room] of this.#rooms)
					if (noteId === openId || this.#isIn(room, programmeId)) room.tell({ kind });
			}
		}
	}

	#heardElsewhere(room: Room, notice: Extract<Notice, { from: string }>): void {
		if (notice.kind === 'updates') room.catchUp(notice.seq);
		else if (notice.kind === 'who is there') room.tellWhoIsHere();
		else room.presence.hearElsewhere(Buffer.from(notice.update, 'base64'));
	}

	#isIn(room: Room, programmeId: string | undefined): boolean {
		const [connection] = room.connections;
		return programmeId !== undefined && connection?.admitted.programmeId === programmeId;
	}

	async #accessChanged({ userId, programmeId }: Announcement): Promise<void> {
		await this.#reviewAll(
			({ admitted }) =>
				(userId === undefined || admitted.person.id === userId) &&
				(programmeId === undefined || admitted.programmeId === programmeId)
		);
	}

	#missed(): void {
		for (const room of this.#rooms.values()) room.fetch();
		void this.#reviewAll(() => true);
	}

	/** Asks again whether connections may stay, and as what. */
	async #reviewAll(whose: (connection: Connection) => boolean): Promise<void> {
		const connections = [...this.#rooms.values()].flatMap((room) => [...room.connections]);
		for (const connection of connections.filter(whose)) {
			const { noteId, cookie, role } = connection.admitted;
			try {
				const admitted = await admit(noteId, cookie);
				if (typeof admitted === 'number') connection.close(admitted);
				else if (admitted.role !== role) this.#roleChanged(connection, admitted);
			} catch (error) {
				// The database does not answer: nothing can be committed either, so it can wait.
				log.warn({ error }, 'whether somebody may stay on a note could not be asked');
			}
		}
	}

	/** Who may edit from now on comes back, so that edits turned away before are asked for. */
	#roleChanged(connection: Connection, admitted: Admitted): void {
		const couldEdit = connection.mayEdit;
		connection.admitted = admitted;
		connection.tell({ kind: 'people' });
		if (!couldEdit && may(admitted.role, 'note.edit')) connection.close(CLOSE.RESTART);
	}
}

function refuse(socket: Duplex, status: number, reason: string): void {
	socket.end(`HTTP/1.1 ${status} ${reason}\r\nConnection: close\r\nContent-Length: 0\r\n\r\n`);
}

/** Counts one more under a key; false when there are as many as may be. */
function take(counts: Map<string, number>, key: string, most: number): boolean {
	const count = counts.get(key) ?? 0;
	if (count >= most) return false;
	counts.set(key, count + 1);
	return true;
}

function give(counts: Map<string, number>, key: string): void {
	const count = (counts.get(key) ?? 1) - 1;
	if (count > 0) counts.set(key, count);
	else counts.delete(key);
}
