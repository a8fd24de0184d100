/**
 * Worker threads for the engine on the server. A task that takes too long or too much memory ends with
 * its thread; the pool starts another. So no note, however hostile, holds up the process.
 *
 * The clock runs from the moment the thread takes the task up, not while it waits for a thread.
 */
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import { Problem } from '../problems';

export type Limits = {
	/** What is computed, as a sentence begins with it: "The note". */
	subject: string;
	worker: string;
	milliseconds: number;
	megabytes: number;
	threads: number;
};

/** Said to the person whose note it is. */
export class EngineLimitError extends Problem {
	constructor(message: string) {
		super(422, message);
	}
}

const LONGEST_QUEUE = 200;
const IDLE_MILLISECONDS = 60_000;

export class EnginePool<Input, Answer> {
	private piscina: Piscina<unknown, Answer>;

	constructor(private limits: Limits) {
		this.piscina = new Piscina<unknown, Answer>({
			filename: limits.worker,
			minThreads: 1,
			maxThreads: limits.threads,
			maxQueue: LONGEST_QUEUE,
			idleTimeout: IDLE_MILLISECONDS,
			resourceLimits: { maxOldGenerationSizeMb: limits.megabytes }
		});
	}

	/** @throws EngineLimitError when time or memory ran out. */
	async run(input: Input): Promise<Answer> {
		const { subject, milliseconds, megabytes } = this.limits;
		const { port1: ours, port2: begun } = new MessageChannel();
		const deadline = new AbortController();
		let timer: NodeJS.Timeout | undefined;
		ours.once('message', () => (timer = setTimeout(() => deadline.abort(), milliseconds)));
		try {
			return await this.piscina.run(
				{ input, begun },
				{ signal: deadline.signal, transferList: [begun] }
			);
		} catch (error) {
			if (deadline.signal.aborted) {
				throw new EngineLimitError(
					`${subject} could not be computed within ${milliseconds / 1000} s.`
				);
			}
			if ((error as { code?: string }).code === 'ERR_WORKER_OUT_OF_MEMORY') {
				throw new EngineLimitError(
					`${subject} could not be computed within ${megabytes} MB of memory.`
				);
			}
			if ((error as Error).message === 'Task queue is at limit')
				throw new Problem(
					503,
					'More is being computed just now than this server can take.',
					{},
					{ 'retry-after': '10' }
				);
			throw error;
		} finally {
			clearTimeout(timer);
			ours.close();
		}
	}

	close(): Promise<void> {
		return this.piscina.destroy();
	}
}
