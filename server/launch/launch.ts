/** The life of a launcher: take the lock, start things, wait, and end them in the opposite order. */
import { makeDataFolder } from './installation';
import { releaseLock, takeLock } from './lock';

type Work = () => Promise<void>;
/** Says to what came up, how to end each thing that was started, as soon as it is. */
export type OnEnd = (work: Work) => void;
/** `ended` resolves, with a message, when what was started ends by itself. */
type Started = { ended: Promise<string> };

export async function launch(start: (onEnd: OnEnd) => Promise<Started>): Promise<void> {
	const endings: Work[] = [];
	// A signal that comes while things start is heeded once they stand: half-started ones cannot be ended.
	const signalled = new Promise<null>((resolve) => {
		for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const)
			process.on(signal, () => resolve(null));
	});

	let failure: string | null;
	try {
		makeDataFolder();
		await takeLock();
		endings.push(async () => releaseLock());
		const { ended } = await start((work) => endings.push(work));
		failure = await Promise.race([signalled, ended]);
	} catch (error) {
		failure = error instanceof Error ? error.message : String(error);
	}
	if (failure !== null) console.error(failure);
	for (const work of endings.reverse()) await work().catch((error) => console.error(error));
	process.exit(failure === null ? 0 : 1);
}
