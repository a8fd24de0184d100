import type { SideHead } from '$lib/server/baselines/sides';

/** "B" for a baseline, "now" for the note as it is. */
export const sideName = (side: SideHead) => (side.kind === 'frozen' ? side.revision : 'now');
